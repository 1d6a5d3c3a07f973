import { sha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js'

/**
 * SHA-256 of bytes, or of a text's UTF-8, as 64 lower-case hex digits.
 * @throws {RangeError} if a text holds a lone surrogate, which UTF-8 cannot write.
 * @source FIPS 180-4.
 */
export function sha256Hex(content: string | Uint8Array): string {
  if (typeof content !== 'string') return bytesToHex(sha256(content))
  if (/\p{Surrogate}/u.test(content)) throw new RangeError('text holds a lone surrogate')
  return bytesToHex(sha256(utf8ToBytes(content)))
}
