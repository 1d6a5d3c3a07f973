import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { VOLUME_RATE_UNITS, VOLUME_UNITS } from '../../../shared/contract/quantity.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { readingAmountUnit, readingUnit, UNIT_SYSTEMS, unitsInOrder } from '../../../shared/units/readingUnit.ts'
import { UNITS, type UnitCode } from '../../../shared/units/unitTable.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }
const codes = Object.keys(UNITS) as UnitCode[]
const anySystem = fc.constantFrom(...UNIT_SYSTEMS)

describe('the unit a figure is read in', () => {
  it('measures the same, and is read as it is by whoever reads that system', () => {
    for (const system of UNIT_SYSTEMS) {
      for (const code of codes) {
        const read = readingUnit(code, system)
        expect(dimensionOf(read)).toBe(dimensionOf(code))
        expect(readingUnit(read, system)).toBe(read)
      }
    }
  })

  it('is another one in the other system for whatever the sheets are worked out in', () => {
    const workedOut: UnitCode[] = ['L', 'mL', 'kg', 'g', 'm2', 'ha', 'm', 'km', 'kmh', 'ms', 'degC', 'diffC', 'bar', 'L/ha', 'mL/ha', 'kg/ha', 'L/min']
    for (const code of workedOut) {
      expect(readingUnit(code, 'metric')).toBe(code)
      expect(readingUnit(readingUnit(code, 'us'), 'us')).not.toBe(code)
    }
  })

  it('loses nothing there and back, to 13 digits', () => {
    fc.assert(fc.property(fc.constantFrom(...codes), anySystem, fc.nat(9_999_999), (code, system, whole) => {
      const value = `${whole}.25`
      const read = readingUnit(code, system)
      const back = convertQuantity({ value: convertQuantity({ value, unit: code }, read), unit: read }, code)
      // A temperature goes through kelvin: its error is relative to that.
      expect(Math.abs(Number(back) - Number(value))).toBeLessThanOrEqual(Math.max(Number(value), 500) * 1e-13)
    }), RUNS)
  })
})

describe('the unit an amount is read in', () => {
  it.each([
    { value: '100', unit: 'L', us: 'galUS' }, { value: '3.785411784', unit: 'L', us: 'galUS' }, { value: '3.7854', unit: 'L', us: 'flozUS' },
    { value: '0', unit: 'L', us: 'galUS' }, { value: '20', unit: 'mL', us: 'flozUS' }, { value: '2', unit: 'kg', us: 'lb' },
    { value: '0.4', unit: 'kg', us: 'oz' }, { value: '0.25', unit: 'galUS', us: 'galUS' }, { value: '2', unit: 'ptUS', us: 'ptUS' },
  ] as const)('$value $unit is read in $us', ({ value, unit, us }) => { expect(readingAmountUnit({ value, unit }, 'us')).toBe(us) })

  it('stays in litres for who reads metric', () => { expect(readingAmountUnit({ value: '0.05', unit: 'L' }, 'metric')).toBe('L') })
})

describe('units to choose from', () => {
  it('begin with the person’s own, and lose none', () => {
    expect(unitsInOrder(VOLUME_UNITS, 'us')).toEqual(['galUS', 'flozUS', 'tbspUS', 'tspUS', 'cupUS', 'ptUS', 'qtUS', 'L', 'mL', 'galImp', 'flozImp'])
    expect(unitsInOrder(VOLUME_UNITS, 'metric')).toEqual(VOLUME_UNITS)
    expect(unitsInOrder(VOLUME_RATE_UNITS, 'us')[0]).toBe('galUS/acre')
    expect(unitsInOrder(['%'], 'us')).toEqual(['%'])
  })
})
