/** Whether all that is written in one content stands in another, too; what is left empty says nothing. */
export function saysNoMore(one: unknown, other: unknown): boolean {
  if (one === null || one === undefined || one === '') return true
  if (typeof one !== 'object') return one === other
  if (typeof other !== 'object' || other === null) return false
  const found = new Map(Object.entries(other))
  return Object.entries(one).every(([name, value]) => saysNoMore(value, found.get(name)))
}
