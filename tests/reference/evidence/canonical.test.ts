import { describe, expect, it } from 'vitest'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'
import { CANONICAL_CASES, NUMBER_CASES } from './canonicalCases.ts'

describe('canonical text, RFC 8785', () => {
  it.each(CANONICAL_CASES)('$id ($source)', ({ json, text, bytes, sha256 }) => {
    const canonical = canonicalText(JSON.parse(json))
    expect(canonical).toBe(text)
    expect(new TextEncoder().encode(canonical)).toHaveLength(bytes)
    expect(sha256Hex(canonical)).toBe(sha256)
  })

  it.each(CANONICAL_CASES)('$id with one letter changed has another digest', ({ text, sha256 }) => {
    expect(sha256Hex(text.replace(/[a-z]/, 'z'))).not.toBe(sha256)
  })

  it.each(NUMBER_CASES)('number $hex is $text (RFC 8785 Appendix B)', ({ hex, text }) => {
    expect(canonicalText(Buffer.from(hex, 'hex').readDoubleBE())).toBe(text)
  })
})

describe('SHA-256, FIPS 180-4', () => {
  it.each([
    { text: '', digest: 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855' },
    { text: 'abc', digest: 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad' },
  ])('"$text"', ({ text, digest }) => {
    expect(sha256Hex(text)).toBe(digest)
    expect(sha256Hex(new TextEncoder().encode(text))).toBe(digest)
    expect(sha256Hex(`${text} `)).not.toBe(digest)
  })
})
