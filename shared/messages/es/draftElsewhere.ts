import type { WordsLike } from '../en.ts'
import type { draftElsewhere as words } from '../en/draftElsewhere.ts'

/** Palabras de un borrador que no se puede seguir donde se abrió. */
export const draftElsewhere: WordsLike<typeof words> = {
  notHere: {
    title: 'Este borrador no está en este dispositivo.',
    text: 'La finca tampoco tiene un registro con esta dirección. Un borrador que no se envió queda en el teléfono u ordenador donde se escribió, para quien lo escribió; uno descartado ya no existe.',
  },
  unread: {
    title: 'Este borrador no está en este dispositivo y la finca no contestó.',
    text: 'Si se envió, se abrirá cuando haya señal. Si no se envió, queda en el teléfono u ordenador donde se escribió.',
  },
  overtaken: {
    title: 'Este registro se firmó entretanto como {number}.',
    text: 'Lo escrito aquí dice otra cosa y no se envió. Queda en este dispositivo hasta que lo descarte. Para cambiar lo firmado, enmiende el registro.',
  },
  discard: 'Descartar lo escrito aquí',
}
