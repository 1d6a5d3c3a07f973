import { describe, expect, it } from 'vitest'
import { formatCheckCode, parseCheckCode } from '../../../shared/evidence/checkCode.ts'

const digest = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'

describe('check code', () => {
  it('shows twenty digits in five groups and reads them back', () => {
    expect(formatCheckCode(digest)).toBe('BA78 16BF 8F01 CFEA 4141')
    expect(parseCheckCode(formatCheckCode(digest))).toBe(digest.slice(0, 20))
  })

  it.each(['ba7816bf8f01cfea4141', ' BA78-16BF-8f01-cfea-4141\n', 'BA78\u00A016BF 8F01.CFEA 4141'])('reads %o', (text) => {
    expect(parseCheckCode(text)).toBe('ba7816bf8f01cfea4141')
  })

  it.each(['', 'BA78 16BF 8F01 CFEA 414', 'BA78 16BF 8F01 CFEA 41410', 'BA78 16BF 8F01 CFEA 414G', 'a'.repeat(10_000)])('refuses %o', (text) => {
    expect(parseCheckCode(text)).toBeNull()
  })

  it.each(['', 'abc', `${digest}0`, digest.replace('b', 'g')])('makes none of %o', (text) => {
    expect(() => formatCheckCode(text)).toThrow(RangeError)
  })
})
