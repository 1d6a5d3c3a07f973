import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { sha256Hex } from '../../../shared/evidence/sha256Hex.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }
const circle: Record<string, unknown> = {}
circle['self'] = circle

describe('canonicalText', () => {
  it.each([
    { what: 'NaN', value: { a: [1, Number.NaN] }, place: '$.a[1] is NaN' },
    { what: 'an infinity', value: Number.NEGATIVE_INFINITY, place: '$ is -Infinity' },
    { what: 'undefined in an object', value: { a: undefined }, place: '$.a is undefined' },
    { what: 'undefined in a list', value: [undefined], place: '$[0] is undefined' },
    { what: 'undefined', value: undefined, place: '$ is undefined' },
    { what: 'a function', value: { a: () => 1 }, place: '$.a is function' },
    { what: 'a bigint', value: { a: 1n }, place: '$.a is bigint' },
    { what: 'a symbol', value: Symbol('a'), place: '$ is symbol' },
    { what: 'a symbol key', value: { [Symbol('a')]: 1 }, place: '$ has a symbol key' },
    { what: 'a lone surrogate', value: { a: '\uD800' }, place: '$.a holds a lone surrogate' },
    { what: 'a lone surrogate in a key', value: { 'x\uDC00': 1 }, place: 'a key of $ holds a lone surrogate' },
    { what: 'a date', value: { a: new Date(0) }, place: '$.a is no plain object' },
    { what: 'a map', value: new Map(), place: '$ is no plain object' },
    { what: 'a circle', value: circle, place: '$.self is a circle' },
  ])('refuses $what', ({ value, place }) => {
    expect(() => canonicalText(value)).toThrow(new RangeError(place))
  })

  it('goes 100 levels deep and says where it stops', () => {
    const nest = (levels: number): unknown => JSON.parse(`${'['.repeat(levels)}${']'.repeat(levels)}`)
    expect(canonicalText(nest(100))).toHaveLength(200)
    expect(() => canonicalText(nest(101))).toThrow(/^\$(\[0\])+.*more than 100 levels deep$/)
    expect(() => canonicalText(nest(100_000))).toThrow(/100 levels deep/)
  })

  it('takes the same object twice, pairs of surrogates and any key', () => {
    const twice = { b: 1 }
    expect(canonicalText({ y: twice, x: twice, '👩‍🌾': 'Süd' })).toBe('{"x":{"b":1},"y":{"b":1},"👩‍🌾":"Süd"}')
    expect(canonicalText(JSON.parse('{"__proto__":{"role":"owner"},"toJSON":1}'))).toBe('{"__proto__":{"role":"owner"},"toJSON":1}')
  })

  it('reads back as the value, the same for any order of keys', () => {
    fc.assert(fc.property(fc.jsonValue({ maxDepth: 4 }), (value) => {
      const text = canonicalText(value)
      expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)))
      expect(canonicalText(turn(value))).toBe(text)
    }), RUNS)
  })
})

describe('sha256Hex', () => {
  it('hashes UTF-8 and refuses what UTF-8 cannot write', () => {
    expect(sha256Hex('Süd')).toBe(sha256Hex(new Uint8Array([0x53, 0xc3, 0xbc, 0x64])))
    expect(() => sha256Hex('a\uD800')).toThrow(RangeError)
  })
})

/** The same value with the keys of every object in the other order. */
function turn(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(turn)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(Object.entries(value).reverse().map(([key, member]) => [key, turn(member)]))
}
