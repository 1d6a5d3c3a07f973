import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { UNITS, type UnitCode } from '../../../shared/units/unitTable.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }
const codes = Object.keys(UNITS) as UnitCode[]
const unit = fc.constantFrom(...codes)
const pairOf = (isSame: boolean) => fc.tuple(unit, unit).filter(([a, b]) => (dimensionOf(a) === dimensionOf(b)) === isSame)
/** What a person may store: up to 7 digits before the point and 4 after. */
const stored = fc.tuple(fc.nat(9_999_999), fc.nat(9_999)).map(([whole, part]) => `${whole}.${String(part).padStart(4, '0')}`)
const significant = (text: string): string => text.replace(/[-.]/g, '').replace(/^0+/, '')

describe('convertQuantity', () => {
  it('comes back to 13 digits at least from any unit of the dimension', () => {
    fc.assert(fc.property(pairOf(true), stored, ([from, to], value) => {
      const there = convertQuantity({ value, unit: from }, to)
      const back = Number(convertQuantity({ value: there, unit: to }, from))
      // A temperature goes through kelvin: its error is relative to that.
      const size = Math.max(Number(value), dimensionOf(from) === 'temperature' ? 500 : 1e-9)
      expect(Math.abs(back - Number(value))).toBeLessThanOrEqual(size * 1e-13)
    }), RUNS)
  })

  it('writes plain decimals of at most 15 significant digits', () => {
    fc.assert(fc.property(pairOf(true), stored, ([from, to], value) => {
      const text = convertQuantity({ value, unit: from }, to)
      expect(text).toMatch(/^-?\d+(\.\d*[1-9])?$/)
      expect(significant(text).replace(/0+$/, '').length).toBeLessThanOrEqual(15)
    }), RUNS)
  })

  it('refuses every pair of different dimensions, naming both units', () => {
    fc.assert(fc.property(pairOf(false), ([from, to]) => {
      expect(() => convertQuantity({ value: '1', unit: from }, to)).toThrow(RangeError)
      expect(() => convertQuantity({ value: '1', unit: from }, to)).toThrow(`${from} is ${dimensionOf(from)}, ${to} is ${dimensionOf(to)}`)
    }), RUNS)
  })

  it('keeps order and doubles with the value', () => {
    fc.assert(fc.property(pairOf(true).filter(([a]) => dimensionOf(a) !== 'temperature'), fc.integer({ min: 1, max: 4_000_000 }), ([from, to], count) => {
      const one = Number(convertQuantity({ value: `${count}`, unit: from }, to))
      const two = Number(convertQuantity({ value: `${count * 2}`, unit: from }, to))
      expect(Math.abs(two / one - 2)).toBeLessThan(1e-13)
    }), RUNS)
  })

  it('writes what a double would round: 9007199254740993 g', () => {
    expect(convertQuantity({ value: '9007199254740.993', unit: 'kg' }, 'kg')).toBe('9007199254740.99')
    expect(convertQuantity({ value: '0.0000001', unit: 'L' }, 'mL')).toBe('0.0001')
  })

  it.each(['', ' ', 'NaN', 'Infinity', '1e3', '0x10', '1,5', '+5', '٣', '.5', '5.', '--1', '12abc'])('refuses the value %o', (value) => {
    expect(() => convertQuantity({ value, unit: 'L' }, 'mL')).toThrow(RangeError)
  })

  it.each(['toString', '__proto__', 'litre', '', 'l'])('refuses the unit %o', (name) => {
    expect(() => dimensionOf(name)).toThrow(RangeError)
  })
})
