import { Decimal } from 'decimal.js'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dilute } from '../../../shared/mix/dilute.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }
const volume = fc.integer({ min: 1, max: 99_999_999 }).map((count) => new Decimal(count).div(10_000).toFixed())
const parts = fc.integer({ min: 10_000, max: 99_999_999 }).map((count) => new Decimal(count).div(10_000).toFixed())

describe('dilute', () => {
  it('product and water are the total', () => {
    fc.assert(fc.property(volume, parts, fc.constantFrom('to' as const, 'in' as const), (value, n, reading) => {
      const { product, water } = dilute({ total: { value, unit: 'galUS' }, n, reading })
      expect(new Decimal(product).plus(water).div(value).minus(1).abs().toNumber()).toBeLessThan(2e-14)
    }), RUNS)
  })

  it('"in N" takes 1/N more product than "to N"', () => {
    fc.assert(fc.property(volume, parts, (value, n) => {
      const inN = new Decimal(dilute({ total: { value, unit: 'L' }, n, reading: 'in' }).product)
      const toN = new Decimal(dilute({ total: { value, unit: 'L' }, n, reading: 'to' }).product)
      expect(inN.div(toN).minus(1).times(n).minus(1).abs().toNumber()).toBeLessThan(1e-6)
    }), RUNS)
  })

  it.each([
    { total: { value: '0', unit: 'L' as const }, n: '30', reading: 'to' as const },
    { total: { value: '-1', unit: 'L' as const }, n: '30', reading: 'to' as const },
    { total: { value: '1', unit: 'kg' as const }, n: '30', reading: 'to' as const },
    { total: { value: '1', unit: 'L' as const }, n: '0', reading: 'to' as const },
    { total: { value: '1', unit: 'L' as const }, n: '0.5', reading: 'in' as const },
    { total: { value: '1e3', unit: 'L' as const }, n: '30', reading: 'to' as const },
  ])('refuses %o', (input) => {
    expect(() => dilute(input)).toThrow(RangeError)
  })
})
