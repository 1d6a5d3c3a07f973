import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Measured } from '../../../shared/contract/calibration.ts'
import { calibrationSheet, nominalFlow } from '../../../shared/mix/calibrationSheet.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'

type Catch = Extract<Measured, { kind: 'catch' }>
const CATCH: Catch = { kind: 'catch', seconds: '60', nozzles: 4, swathM: '2', speedKmH: '6', catchesMl: ['1000', '1000', '1000', '1000'] }
const worn = (catchesMl: string[], fitting: Parameters<typeof calibrationSheet>[1] = null) =>
  calibrationSheet({ ...CATCH, catchesMl, nozzles: catchesMl.length }, fitting).nozzles.map(({ isWorn }) => isWorn)

describe('a timed catch', () => {
  it('gives flow, rate and the mean', () => {
    expect(calibrationSheet(CATCH)).toMatchObject({ rateLPerHa: '200', flowLPerMin: '4', meanLPerMin: '1', courseFt: null })
    expect(calibrationSheet({ ...CATCH, nozzles: 8 })).toMatchObject({ flowLPerMin: '8', rateLPerHa: '400' })
  })

  it('flags from ten percent off the mean on, either way, and not under it', () => {
    // Mean 1000: the odd one out is exactly 10 % off it, then a hair under.
    expect(worn(['1100', '950', '950'])).toEqual([true, false, false])
    expect(worn(['900', '1050', '1050'])).toEqual([true, false, false])
    expect(worn(['1099', '950.5', '950.5'])).toEqual([false, false, false])
  })

  it('flags a set that is worn evenly, where its size and pressure are known', () => {
    const fitting = { nozzle: { kind: 'iso', size: '02' } as const, pressureBar: '3' }
    expect(worn(['880', '880'], fitting)).toEqual([true, true])
    expect(worn(['879', '879'], fitting)).toEqual([false, false])
    expect(worn(['880', '880'], { ...fitting, pressureBar: null })).toEqual([false, false])
    // Too little is a blocked screen, not a worn tip: only the mean tells it.
    expect(worn(['600', '600'], fitting)).toEqual([false, false])
  })

  const ml = fc.integer({ min: 1, max: 99_999 }).map(String)
  const measure = fc.integer({ min: 1, max: 9_999 }).map((tenths) => String(tenths / 10))

  it('is the same in any order, doubles with the catch and halves with speed, width or time', () => {
    fc.assert(fc.property(fc.array(ml, { minLength: 1, maxLength: 20 }), measure, measure, measure, (catchesMl, seconds, swathM, speedKmH) => {
      const input: Catch = { kind: 'catch', catchesMl, seconds, swathM, speedKmH, nozzles: catchesMl.length }
      const rate = (changed: Partial<Catch>) => Number(calibrationSheet({ ...input, ...changed }).rateLPerHa)
      const twice = (text: string) => String(Number(text) * 2)
      const is = rate({})
      for (const [changed, factor] of [
        [{ catchesMl: [...catchesMl].reverse() }, 1], [{ catchesMl: catchesMl.map(twice) }, 2],
        [{ seconds: twice(seconds) }, 0.5], [{ swathM: twice(swathM) }, 0.5], [{ speedKmH: twice(speedKmH) }, 0.5],
      ] as const) expect(Math.abs(rate(changed) / (is * factor) - 1)).toBeLessThan(1e-12)
    }))
  })

  it('is off its own mean by nothing in sum', () => {
    fc.assert(fc.property(fc.array(ml, { minLength: 1, maxLength: 20 }), (catchesMl) => {
      const { nozzles } = calibrationSheet({ ...CATCH, catchesMl, nozzles: catchesMl.length })
      expect(Math.abs(nozzles.reduce((sum, { offMeanPercent }) => sum + Number(offMeanPercent), 0))).toBeLessThan(1e-6)
    }))
  })
})

describe('the other ways', () => {
  it('agree with one another on one and the same sprayer', () => {
    // Half a metre at 6 km/h and 0.8 L/min: 160 L/ha, told four ways.
    const byFlow = calibrationSheet({ kind: 'flow', flowLPerMin: '0.8', speedKmH: '6', swathM: '0.5' })
    const byCatch = calibrationSheet({ ...CATCH, nozzles: 1, swathM: '0.5', catchesMl: ['800'] })
    const byPlot = calibrationSheet({ kind: 'plot', volumeL: '0.8', areaM2: '50' })
    expect([byFlow, byCatch, byPlot].map(({ rateLPerHa }) => rateLPerHa)).toEqual(['160', '160', '160'])
    const ounces = Number(byFlow.galUSPerAcre).toFixed(4)
    const byCourse = calibrationSheet({ kind: 'course', widthIn: '19.685', ounces })
    expect(Number(byCourse.rateLPerHa)).toBeCloseTo(160, 2)
    expect(Number(convertQuantity({ value: byCourse.rateLPerHa, unit: 'L/ha' }, 'galUS/acre'))).toBeCloseTo(Number(ounces), 9)
  })

  it.each<Measured>([
    { kind: 'flow', flowLPerMin: '0', speedKmH: '6', swathM: '1' },
    { kind: 'plot', volumeL: '1', areaM2: '0' },
    { kind: 'course', widthIn: '0', ounces: '3' },
    { ...CATCH, seconds: '0' },
    { ...CATCH, catchesMl: ['0'] },
  ])('refuse %j', (measured) => {
    expect(() => calibrationSheet(measured)).toThrow(RangeError)
  })
})

it('knows what a nozzle should give only where size and pressure are said', () => {
  expect(nominalFlow({ nozzle: { kind: 'iso', size: '04' }, pressureBar: '3' })?.toString()).toBe('1.6')
  expect(nominalFlow({ nozzle: { kind: 'other', name: 'Brass cone', flowLPerMin: null }, pressureBar: '3' })).toBeNull()
  expect(nominalFlow({ nozzle: { kind: 'other', name: 'Brass cone', flowLPerMin: '1' }, pressureBar: '12' })?.toString()).toBe('2')
  expect(nominalFlow({ nozzle: null, pressureBar: '3' })).toBeNull()
  expect(nominalFlow(null)).toBeNull()
})
