import { Decimal } from 'decimal.js'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { splitLoads } from '../../../shared/mix/splitLoads.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }
const figure = (max: number) => fc.integer({ min: 1, max }).map((count) => new Decimal(count).div(1_000).toFixed())

describe('splitLoads', () => {
  it('full × tank + last is the total, and the last load is less than a tank', () => {
    fc.assert(fc.property(figure(500_000), figure(2_000_000), figure(5_000_000), (areaHa, rateLPerHa, tankL) => {
      const { totalL, full, lastL, lastAreaHa } = splitLoads({ areaHa, rateLPerHa, tankL })
      expect(new Decimal(tankL).times(full).plus(lastL).eq(totalL)).toBe(true)
      expect(Number(lastL)).toBeLessThan(Number(tankL))
      expect(Math.abs(Number(lastAreaHa) * Number(rateLPerHa) - Number(lastL))).toBeLessThan(1e-9)
    }), RUNS)
  })

  it('has no last load where the tank divides the total', () => {
    expect(splitLoads({ areaHa: '4', rateLPerHa: '300', tankL: '400' })).toEqual({ totalL: '1200', full: 3, lastL: '0', lastAreaHa: '0' })
    expect(splitLoads({ areaHa: '0.3', rateLPerHa: '1', tankL: '0.1' })).toMatchObject({ full: 3, lastL: '0' })
  })

  it.each([{ areaHa: '0' }, { rateLPerHa: '-1' }, { tankL: '0' }, { tankL: 'NaN' }])('refuses %o', (bad) => {
    expect(() => splitLoads({ areaHa: '1', rateLPerHa: '300', tankL: '400', ...bad })).toThrow(RangeError)
  })
})
