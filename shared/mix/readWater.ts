import type { Each } from '../contract/each.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'
import { readPositive } from './readPositive.ts'
import type { SheetFinding, SheetInput } from './sheetTypes.ts'

/**
 * How the mix is sized, exact: litres of water; litres of mix a hectare or for each; or litres or kilograms of one component.
 * A mix without water is sized by 0 litres of it.
 */
export type ReadWater =
  | { sizedFrom: 'water' | 'sprayRate'; si: ExactDecimal }
  | { sizedFrom: 'perEach'; si: ExactDecimal; each: Each }
  | { sizedFrom: 'jar'; si: ExactDecimal; component: number; isLiquid: boolean }

/** Reads how the mix is sized; null with a finding where it is missing or its unit does not fit. */
export function readWater({ water, isDry }: Pick<SheetInput, 'water' | 'isDry'>, findings: SheetFinding[]): ReadWater | null {
  if (isDry || water?.sizedFrom === 'none') return { sizedFrom: 'water', si: new ExactDecimal(0) }
  const value = water && readPositive(water.value)
  if (water && !doesFit(water)) {
    findings.push({ code: 'unit.not_allowed', params: { unit: water.unit }, path: 'water' })
    return null
  }
  if (!water || !value) {
    findings.push({ code: 'sheet.no_water', params: {}, path: 'water' })
    return null
  }
  const si = siValue(value, water.unit as UnitCode)
  switch (water.sizedFrom) {
    case 'perEach':
      return { sizedFrom: 'perEach', si, each: water.each }
    case 'jar':
      return { sizedFrom: 'jar', si, component: water.component, isLiquid: dimensionOf(water.unit as UnitCode) === 'volume' }
    default:
      return { sizedFrom: water.sizedFrom, si }
  }
}

function doesFit({ sizedFrom, unit }: { sizedFrom: string; unit: string }): boolean {
  if (!Object.hasOwn(UNITS, unit)) return false
  const dimension = dimensionOf(unit)
  if (sizedFrom === 'jar') return dimension === 'volume' || dimension === 'mass'
  return dimension === (sizedFrom === 'sprayRate' ? 'volumePerArea' : 'volume')
}
