const CODE_LENGTH = 20

/** The part of a digest that is its check code: 20 hex digits, lower case, as it is looked up and handed on. */
export function cutCheckCode(digestHex: string): string {
  return digestHex.slice(0, CODE_LENGTH)
}

/**
 * The check code of a digest, as printed: its first 20 hex digits in five groups of four, capital letters, parted by spaces.
 * @throws {RangeError} if it is not 64 hex digits.
 */
export function formatCheckCode(digestHex: string): string {
  if (!/^[0-9a-f]{64}$/i.test(digestHex)) throw new RangeError('digest is not 64 hex digits')
  return cutCheckCode(digestHex).toUpperCase().replace(/(.{4})(?=.)/g, '$1 ')
}

/** The 20 hex digits of a check code as a person types it, lower case; spaces, hyphens and points are passed over. Null if it is none. */
export function parseCheckCode(text: string): string | null {
  const digits = text.slice(0, 200).replace(/[\s\u00A0.\u2010-\u2015-]/g, '').toLowerCase()
  return /^[0-9a-f]{20}$/.test(digits) ? digits : null
}
