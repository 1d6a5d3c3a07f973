const NAME = /^(?:UTC|[A-Z][A-Za-z0-9_+-]*(?:\/[A-Z][A-Za-z0-9_+-]*)+)$/

/**
 * True for a time zone name of the IANA database as it is written there, `Pacific/Honolulu`; abbreviations like `EST5EDT`, bare
 * offsets and places off the earth are none.
 */
export function isZone(name: string): boolean {
  if (!NAME.test(name)) return false
  try {
    const known = new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone
    return known === name || known.toLowerCase() !== name.toLowerCase()
  } catch {
    // The engine's only answer to an unknown zone is to throw.
    return false
  }
}
