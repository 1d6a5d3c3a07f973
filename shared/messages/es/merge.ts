/** Words where two people changed one thing, in Spanish. */
export const merge = {
  title: 'Alguien lo cambió desde que usted lo abrió. No se pierde nada.',
  taken: 'Se tomó lo suyo, porque usted no lo había tocado: {fields}.',
  clash: 'Los dos cambiaron: {field}. Elija:',
  theirs: 'Lo de la otra persona: {value}', mine: 'Lo suyo: {value}', nothing: 'nada', yes: 'sí', no: 'no', other: 'tal como está allí',
  again: 'Mírelo una vez más y guárdelo.',
}
