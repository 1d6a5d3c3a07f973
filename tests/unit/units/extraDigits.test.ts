import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { extraDigits } from '../../../shared/units/extraDigits.ts'

const column = (values: string[], digits: number) => values.map((value) => ({ value, digits }))

describe('extraDigits', () => {
  it.each([
    [['372.0', '419.3'], '791.3', 1, 0],
    [['0.88154', '0.99455'], '1.87609', 2, 1],
    [['0.5', '0.5'], '2', 1, null],
    [[], '0', 1, 0],
  ])('%j against %s', (values, total, digits, extra) => {
    expect(extraDigits(column(values, digits), { value: total, digits })).toBe(extra)
  })

  it('takes a typed figure as it stands and keeps to the most decimals', () => {
    expect(extraDigits([{ value: '378.5412', digits: null }, { value: '1.4588', digits: 2 }], { value: '380', digits: 1 })).toBe(0)
    expect(extraDigits(column(['0.05', '0.05'], 1).map((figure) => ({ ...figure, most: 1 })), { value: '0.1', digits: 1 })).toBeNull()
  })

  it('comes, added up as printed, to the total as printed', () => {
    const cents = fc.array(fc.integer({ min: 1, max: 99_999_999 }), { minLength: 1, maxLength: 20 })
    fc.assert(fc.property(cents, fc.integer({ min: 0, max: 2 }), (units, digits) => {
      const scale = 10_000
      const total = units.reduce((sum, unit) => sum + unit, 0)
      const extra = extraDigits(units.map((unit) => ({ value: (unit / scale).toFixed(4), digits })), { value: (total / scale).toFixed(4), digits })
      if (extra === null) return
      // Worked in whole ten-thousandths, apart from the library's decimals.
      const round = (unit: number, to: number): number => Math.floor(unit / 10 ** (4 - to) + 0.5) * 10 ** (4 - to)
      const printed = units.reduce((sum, unit) => sum + round(unit, Math.min(digits + extra, 4)), 0)
      expect(round(printed, digits)).toBe(round(total, digits))
    }))
  })
})
