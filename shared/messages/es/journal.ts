import type { Messages } from '../en.ts'

export const journal: Messages['journal'] = {
  title: 'Diario',
  intro: 'Quién hizo qué, cuándo y desde dónde. Lo escribe el propio acto y nunca se cambia.',
  action: {
    farm: { created: 'Creó la finca', factor_asked: 'Pidió un segundo factor a quien dirige y certifica', factor_not_asked: 'Dejó de pedir un segundo factor', updated: 'Cambió los datos de la finca' },
    start: { updated: 'Saltó un paso de la primera hora o la guardó' },
    practice: { put_away: 'Guardó la finca de práctica' },
    block: {
      created: 'Dibujó una parcela', updated: 'Cambió una parcela', redrawn: 'Redibujó una parcela', land_set: 'Fijó el estado del terreno de una parcela',
      ended_by_split: 'Dividió una parcela', ended_by_merge: 'Unió una parcela a otras', ended_by_undone: 'Terminó una parcela cuya división o unión se deshizo', reopened: 'Deshizo una división o una unión',
    },
    planting: { created: 'Añadió una plantación', updated: 'Cambió una plantación' },
    bed: { created: 'Añadió bancales o hileras', updated: 'Cambió bancales o hileras' },
    event: { created: 'Anotó una labor', withdrawn: 'Retiró una labor' },
    site: { created: 'Añadió un lugar del que apartarse', changed: 'Cambió un lugar del que apartarse' },
    ground: { created: 'Dibujó parte del plano del terreno', changed: 'Cambió parte del plano del terreno' },
    material: { created: 'Añadió un insumo' },
    lot: { received: 'Recibió un lote', counted: 'Contó un lote' },
    sprayer: { created: 'Añadió un pulverizador', updated: 'Cambió un pulverizador', retired: 'Puso fuera de uso un pulverizador' },
    calibration: { created: 'Calibró un pulverizador', withdrawn: 'Retiró una calibración' },
    record: {
      draft: 'Empezó un registro', started: 'Inició un registro', updated: 'Cambió un registro sin firmar', signed: 'Firmó un registro', amended: 'Enmendó un registro',
      withdrawn: 'Retiró un registro', reviewed: 'Revisó un registro', discarded: 'Descartó un registro sin firmar',
    },
    file: { added: 'Añadió una foto o un documento', removed: 'Quitó una foto o un documento' },
    person: {
      added: 'Dio de alta a alguien', renamed: 'Cambió el nombre de una persona', role_changed: 'Cambió la función de una persona', let_go: 'Dio de baja a alguien', taken_back: 'Dio de alta otra vez a alguien',
      pin_set: 'Puso el PIN de una persona', sessions_ended: 'Cerró las sesiones de una persona', factor_reset: 'Quitó el segundo factor de una persona',
    },
    phone: { enrolled: 'Hizo de la finca un teléfono', revoked: 'Quitó un teléfono a la finca' },
    grant: { given: 'Concedió campañas a una certificadora', changed: 'Cambió una concesión', ended: 'Terminó una concesión' },
    plan: { created: 'Hizo un plan de campaña', updated: 'Cambió un plan de campaña', ended: 'Terminó un plan de campaña', reopened: 'Retiró el fin de un plan de campaña' },
    job: { moved: 'Movió una tarea', skipped: 'Saltó una tarea', unskipped: 'Retiró el salto de una tarea' },
    report: { downloaded: 'Descargó un informe de campaña' },
  },
}
