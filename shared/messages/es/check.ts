import type { Messages } from '../en.ts'

export const check: Messages['check'] = {
  season: 'El informe de la campaña {season}, con todos los asientos de la campaña hasta el {seq}; hecho por primera vez el {day}.',
  seasonChanged: 'Con este código se hizo el {day} un informe de la campaña {season}, y los asientos de la campaña hasta el {seq} ya no son los de entonces. Guarde el papel y pregunte a la finca.',
  wentOn: 'Desde entonces se añadieron asientos a la campaña. Pida un informe más nuevo para verlos.',
  seasonShows: 'Muestra que ninguno de esos asientos se cambió, se quitó ni se coló desde entonces.',
  seasonShowsNot: 'No muestra que lo que dicen sea verdad, que no falte nada, ni que el trabajo fuera lícito.',
}
