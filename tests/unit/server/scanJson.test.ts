import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { scanJson } from '../../../server/middleware/scanJson.ts'

describe('scanJson', () => {
  it.each([
    '{"a":1,"a":2}', '{ "a" : 1 ,\n"a" : 1 }', '{"ab":1,"a\\u0062":2}', '[{"b":{"x":"a","x":1}}]', '{"a":[{"a":1}],"a":0}', '{"":1,"":2}', '{"\\"":1,"\\u0022":2}',
    '{"__proto__":1,"__proto__":2}',
  ])('finds a key twice in %s', (text) => {
    expect(scanJson(text)).toBe('json_duplicate_key')
  })

  it.each([
    '{"a":1,"b":"a","c":["a","a"],"d":{"a":1}}', '[{"a":1},{"a":1}]', '{"a":"{\\"a\\":1,\\"a\\":2}"}', '{"a\\\\":1,"a":2}', '{"A":1,"a":2}', '"a"', '', '{"a', '}{"a":1}', '{"a\\q":1,"a\\q":2}',
  ])('finds nothing in %s', (text) => {
    expect(scanJson(text)).toBeNull()
  })

  it('counts levels outside strings', () => {
    const nest = (levels: number, inner: string) => `${'[{"a":'.repeat(levels / 2)}${inner}${'}]'.repeat(levels / 2)}`
    expect(scanJson(nest(64, '1'))).toBeNull()
    expect(scanJson(nest(64, '[]'))).toBe('json_too_deep')
    expect(scanJson(nest(64, `"${'['.repeat(100)}"`))).toBeNull()
    expect(scanJson('['.repeat(1_000_000))).toBe('json_too_deep')
  })

  it('lets everything pass that is written from a value', () => {
    fc.assert(fc.property(fc.jsonValue({ maxDepth: 6 }), fc.constantFrom(0, 1, 4), (value, indent) => {
      expect(scanJson(JSON.stringify(value, null, indent))).toBeNull()
    }), { seed: 20_260_616, numRuns: 500 })
  })
})
