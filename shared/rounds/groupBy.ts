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
