import type { Messages } from '../en.ts'

/** Words of signing in and signing by PIN, and of the code of a second factor, in Spanish. */
export const pin: Messages['pin'] = {
  yours: 'Su PIN',
  short: 'PIN',
  who: '¿Quién es usted?',
  onPhone: '{phone}, {farm}',
  pinOf: 'PIN de {name}',
  another: 'Otro nombre',
  open: 'Abrir el libro de registros',
  byEmail: 'Entrar con correo',
  byPin: 'Entrar con PIN',
  nobody: 'Nadie tiene PIN todavía. El titular lo pone en la página de personas.',
  pinNeeded: 'Escriba sus seis cifras.',
  wrong: 'El nombre y el PIN no coinciden. Inténtelo otra vez; si sigue así, pregunte al titular si usted sigue entre las personas de la finca.',
  code: 'Código del segundo factor',
  codeHint: 'Seis cifras de su autenticador, o un código de recuperación.',
  codeNeeded: 'Escriba el código.',
  reentryTitle: 'Escriba su PIN para seguir',
  handOver: 'Entregar',
  sessionHint: 'La sesión se cierra sola a las 12 horas.',
}
