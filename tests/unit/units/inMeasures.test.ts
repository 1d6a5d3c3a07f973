import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inMeasures, type Measure } from '../../../shared/units/inMeasures.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import { siValue } from '../../../shared/units/siValue.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'

const unit = (code: UnitCode): Measure => ({ name: null, value: '1', unit: code })
const bucket: Measure = { name: 'bucket', value: '20', unit: 'L' }
const jug: Measure = { name: 'jug', value: '500', unit: 'mL' }
const kitchen = ['galUS', 'qtUS', 'cupUS', 'tbspUS', 'tspUS'].map((code) => unit(code as UnitCode))

const said = (value: string, code: UnitCode, measures: readonly Measure[]) => {
  const way = inMeasures({ value, unit: code }, measures)
  return way && { scoops: way.scoops.map(({ measure, count }) => `${count} ${measure.name ?? measure.unit}`), errorPct: Number(way.errorPct.toFixed(2)) }
}

describe('an amount in the measures at hand', () => {
  // A US cup is 8 US fluid ounces of 29.5735295625 mL, a tablespoon half of one, a teaspoon a sixth (NIST Handbook 44, App. C).
  it.each([
    { name: 'is exact where the units are', value: '8', code: 'flozUS' as const, measures: kitchen, wanted: { scoops: ['1 cupUS'], errorPct: 0 } },
    { name: 'takes two measures where one does not do', value: '739.3', code: 'mL' as const, measures: [unit('cupUS'), unit('tbspUS')], wanted: { scoops: ['3 cupUS', '2 tbspUS'], errorPct: 0.01 } },
    { name: 'says how far under it is', value: '750', code: 'mL' as const, measures: [unit('cupUS')], wanted: { scoops: ['3 cupUS'], errorPct: -5.36 } },
    { name: 'counts a vessel by what it holds', value: '46', code: 'L' as const, measures: [bucket, jug], wanted: { scoops: ['2 bucket', '12 jug'], errorPct: 0 } },
    { name: 'takes fewer scoops within half a percent', value: '20.05', code: 'L' as const, measures: [bucket, jug, unit('tspUS')], wanted: { scoops: ['1 bucket'], errorPct: -0.25 } },
    { name: 'weighs what is weighed', value: '1', code: 'kg' as const, measures: [unit('lb'), unit('oz'), unit('cupUS')], wanted: { scoops: ['2 lb', '3 oz'], errorPct: -0.78 } },
    { name: 'is silent without a measure of its kind', value: '1', code: 'kg' as const, measures: kitchen, wanted: null },
    { name: 'is silent where nobody would count so far', value: '900', code: 'L' as const, measures: [unit('tspUS')], wanted: null },
    { name: 'is silent where nothing comes near', value: '1', code: 'mL' as const, measures: [bucket], wanted: null },
  ])('$name', ({ value, code, measures, wanted }) => {
    expect(said(value, code, measures)).toEqual(wanted)
  })

  it('says an error that the measures themselves give, and never counts past twenty', () => {
    const amount = fc.integer({ min: 1, max: 5_000_000 }).map((count) => new ExactDecimal(count).div(1000).toFixed())
    fc.assert(fc.property(amount, fc.constantFrom('mL' as const, 'L' as const, 'flozUS' as const), fc.subarray([...kitchen, bucket, jug], { minLength: 1 }), (value, code, measures) => {
      const way = inMeasures({ value, unit: code }, measures)
      if (way === null) return
      const held = way.scoops.reduce((sum, { measure, count }) => sum.plus(siValue(new ExactDecimal(measure.value), measure.unit).times(count)), new ExactDecimal(0))
      const asked = siValue(new ExactDecimal(value), code)
      expect(held.minus(asked).div(asked).times(100).toNumber()).toBeCloseTo(way.errorPct, 9)
      expect(way.scoops.length).toBeLessThanOrEqual(2)
      for (const { count } of way.scoops) expect(count).toBeGreaterThan(0)
      for (const { count } of way.scoops) expect(count).toBeLessThanOrEqual(20)
    }), { seed: 20_260_616, numRuns: 300 })
  })

  it('is nothing of nothing', () => {
    expect(inMeasures({ value: '0', unit: 'L' }, kitchen)).toBeNull()
    expect(() => inMeasures({ value: 'x', unit: 'L' }, kitchen)).toThrow()
  })
})
