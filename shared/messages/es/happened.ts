import type { Messages } from '../en.ts'

export const happened: Messages['happened'] = {
  changeMix: 'Cambiar la mezcla',
  nextBlock: 'Siguiente parcela',
}
