import type { WordsLike } from '../en.ts'
import type { versions as words } from '../en/versions.ts'

/** Palabras de las versiones de un registro firmado. */
export const versions: WordsLike<typeof words> = {
  text: '{text}',
  amount: '{value} {unit}',
  moment: '{dayOn}, {time}',
  day: '{dayOn}',
  notSaid: 'sin decir',
  part: {
    whole: 'parcela entera',
    fraction: '{fraction} de la parcela',
    drawn: 'una parte según el dibujo, {hectares} ha, contorno {outline}',
    rows: 'hileras {from} a {to} de {of}',
    beds: 'bancales {from} a {to} de {of}',
  },
  count: { plant: '{count} plantas', tree: '{count} árboles', rowM: '{count} m de hilera', bed: '{count} bancales', pot: '{count} macetas' },
  forEach: { plant: 'por cada planta', tree: 'por cada árbol', rowM: 'por cada metro de hilera', bed: 'por cada bancal', pot: 'por cada maceta' },
  ratio: { to: '1 parte en {parts} partes de agua', in: '1 parte en {parts} partes de la mezcla' },
  basis: { perTank: 'en cada tanque lleno', total: 'en total' },
  sized: { water: 'de agua de mezcla', sprayRate: 'de la mezcla', perEach: 'de la mezcla', jar: 'del ingrediente {number}, {name}' },
  label: {
    method: 'Método', blocks: 'Parcelas', part: 'Parte', counts: 'Contado', stage: 'Estado de crecimiento', bbch: 'BBCH', startedAt: 'Inicio', endedAt: 'Fin', amount: 'Cantidad',
    components: 'Ingredientes', lot: 'Lote', basis: 'Medida', used: 'Usado', inAll: 'En total', water: 'Según', sprayer: 'Pulverizador', workedInOn: 'Incorporado',
    wind: 'Viento', windFrom: 'Viento de', air: 'Aire', humidity: 'Humedad', protection: 'Protección usada', doneBy: 'Hecho por', area: 'Superficie tratada', totalL: 'Mezcla en total',
    totalKg: 'Pesado en total', keepOut: 'No entrar hasta', pickFrom: 'No cosechar hasta', stops: 'Altos', cautions: 'Precauciones', unknowns: 'No se sabe',
    said: 'Dicho de lo improbable o detenido', files: 'Fotos y papeles',
  },
}
