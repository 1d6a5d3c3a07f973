const NAME = /^(?:UTC|[A-Z][A-Za-z0-9_+-]*(?:\/[A-Z][A-Za-z0-9_+-]*)+)$/
/** Names that engines know and the IANA database does not, or no more. */
const STRAY = /^(?:SystemV\/|(?:US\/Pacific-New|Canada\/East-Saskatchewan|Etc\/Unknown)$)/
const PLACES = new Set([...Intl.supportedValuesOf('timeZone'), 'UTC'])

/**
 * True for a time zone name of the IANA database as it is written there, `Pacific/Honolulu`, or an older name of such a place;
 * abbreviations like `EST5EDT`, bare offsets and places off the earth are none.
 */
export function isZone(name: string): boolean {
  if (PLACES.has(name)) return true
  if (!NAME.test(name) || STRAY.test(name)) return false
  try {
    const known = new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone
    // Some engines answer an older name with itself, others with the place's name of today; a change of case alone is neither.
    return known === name || (PLACES.has(known) && known.toLowerCase() !== name.toLowerCase())
  } catch {
    // The engine's only answer to an unknown zone is to throw.
    return false
  }
}
