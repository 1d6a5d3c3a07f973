import { compareCodes } from '../records/compareCodes.ts'

/** Things by a key of theirs, in the order in which the keys first came. */
export function groupBy<Thing>(things: readonly Thing[], keyOf: (thing: Thing) => string): Map<string, Thing[]> {
  const groups = new Map<string, Thing[]>()
  for (const thing of things) {
    const key = keyOf(thing)
    const group = groups.get(key)
    if (group === undefined) groups.set(key, [thing])
    else group.push(thing)
  }
  return groups
}

/** Orders things by the code of their block as a farm counts them: V2 before V10. */
export const byBlock = (one: { blockCode: string }, other: { blockCode: string }): number => compareCodes(one.blockCode, other.blockCode)
