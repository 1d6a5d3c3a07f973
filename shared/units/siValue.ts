import type { ExactDecimal } from './exactDecimal.ts'
import { UNITS, type UnitCode } from './unitTable.ts'

/**
 * An exact value of a unit without offset as its stored unit (litres, kilograms, square metres, litres or kilograms a hectare),
 * unrounded to 40 digits.
 */
export function siValue(value: ExactDecimal, unit: UnitCode): ExactDecimal {
  const [numerator, denominator] = UNITS[unit].toSi
  return value.times(numerator).div(denominator)
}
