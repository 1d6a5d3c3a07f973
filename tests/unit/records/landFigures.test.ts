import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { landFigures, landShares } from '../../../shared/records/landFigures.ts'

type Known = 'measured' | 'counted' | 'workedOut'
const line = (value: string, unit: 'L' | 'galUS' | 'kg' = 'L', known: Known = 'measured') => ({ amount: { value, unit, known } })
const share = (shareL: string | null, shareKg: string | null = null) => ({ areaM2: 1, shareL, shareKg, reEntryUntil: null, pickFrom: null })
const MIX = { areaHa: 2, totalL: 1000, totalKg: 12, sprayPerEach: null }

describe('what went on the land', () => {
  it('is the whole mix where nothing was measured on the lines', () => {
    const figures = { totalL: '1000', totalKg: '12', sprayLPerHa: '500', kgPerHa: '6', sprayPerEach: null }
    expect(landFigures([{ amount: null }, { amount: null }], MIX)).toEqual(figures)
    // A share of a third written out to four decimals is no measurement: the sum of it is not the mix.
    expect(landFigures([line('333.3333', 'L', 'workedOut'), line('333.3333', 'L', 'workedOut'), line('333.3333', 'L', 'workedOut')], MIX)).toEqual(figures)
    // Half of it is known, half is not.
    expect(landFigures([line('400'), { amount: null }], MIX)).toEqual(figures)
  })

  it('is what was measured: a tenth stayed in the tank, and with it a tenth of what was weighed into it', () => {
    expect(landFigures([line('600'), line('300', 'L', 'counted')], MIX)).toEqual({ totalL: '900', totalKg: '10.8', sprayLPerHa: '450', kgPerHa: '5.4', sprayPerEach: null })
    // 100 US gallons of 3.785411784 L (NIST Handbook 44, appendix C).
    expect(landFigures([line('100', 'galUS')], MIX)).toMatchObject({ totalL: '378.5411784', sprayLPerHa: '189.2705892' })
  })

  it('goes on each plant in the same share', () => {
    const mix = { ...MIX, totalKg: null, sprayPerEach: { each: 'plant' as const, litres: 0.5 } }
    expect(landFigures([line('800')], mix)).toMatchObject({ sprayPerEach: { each: 'plant', litres: '0.4' } })
  })

  it('is kilograms of what was spread dry', () => {
    const dry = { areaHa: 0.5, totalL: null, totalKg: 1000, sprayPerEach: null }
    expect(landFigures([line('950', 'kg')], dry)).toEqual({ totalL: null, totalKg: '950', sprayLPerHa: null, kgPerHa: '1900', sprayPerEach: null })
  })

  it('has no rate on no ground', () => {
    expect(landFigures([line('950')], { ...MIX, areaHa: 0 })).toMatchObject({ totalL: '950', sprayLPerHa: null, kgPerHa: null })
  })

  it('adds up over the lines to the figures of the record', () => {
    const amount = fc.integer({ min: 1, max: 90_000 }).map((tenths) => String(tenths / 10))
    const lines = fc.array(fc.record({ amount: fc.option(fc.record({ value: amount, unit: fc.constant('L' as const), known: fc.constantFrom<Known>('measured', 'counted', 'workedOut') })) }), { minLength: 1, maxLength: 8 })
    fc.assert(fc.property(lines, fc.integer({ min: 1, max: 50 }), (written, kilograms) => {
      const mix = { areaHa: 3, totalL: 100 * written.length, totalKg: kilograms * written.length, sprayPerEach: null }
      const whole = landFigures(written, mix)
      const parts = landShares(written, { ...mix, lines: written.map(() => share('100', String(kilograms))) })
      expect(parts.reduce((sum, { litres }) => sum + Number(litres), 0)).toBeCloseTo(Number(whole.totalL), 6)
      expect(parts.reduce((sum, { kg }) => sum + Number(kg), 0)).toBeCloseTo(Number(whole.totalKg), 6)
    }))
  })
})
