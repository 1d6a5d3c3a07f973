import type { Messages } from '../en.ts'

export const likely: Messages['likely'] = {
  time: {
    title: 'Tiempo en {code}',
    none: '{value}\u00A0{unit} en 0 min: el inicio y el fin son iguales. ¿Cuándo terminó?',
    fast: '{value}\u00A0{unit} en {minutes} min. A {flow}\u00A0{flowUnit}/min hacen falta {need} min. ¿Qué cifra está mal?',
    long: '{hours} h sin pausa para {value}\u00A0{unit}. ¿Está bien el día del fin?',
  },
  applied: {
    title: 'Sobre el terreno',
    text: '{applied} de {total}\u00A0{unit}: sobran {rest}\u00A0{unit}. ¿Hay una cantidad mal?',
    over: '{applied} de {total}\u00A0{unit} mezclados: se aplicó más de lo que había. ¿Es esa la unidad?',
  },
  used: {
    title: '{material}, lo tomado',
    text: '{value}\u00A0{unit} frente a {planned}\u00A0{unit} en la mezcla: {percent}\u00A0%. ¿Es esa la unidad?',
  },
  reading: {
    wind: 'Viento tal como se anotó',
    air: 'Aire tal como se anotó',
    text: '{value}\u00A0{unit} queda fuera de {low} a {high}\u00A0{limitUnit}. ¿Es esa la unidad?',
  },
}
