type Said<Parts> = { [Key in keyof Parts]?: Exclude<Parts[Key], undefined> }

/** The parts of a change that were sent; what was left out is to stay as it is. */
export function saidParts<Parts extends object>(parts: Parts): Said<Parts> {
  return Object.fromEntries(Object.entries(parts).filter(([, value]) => value !== undefined)) as Said<Parts>
}
