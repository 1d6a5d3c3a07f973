import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, readDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'

export interface UsedAgainstPlanned {
  direction: 'more' | 'less' | 'same'
  /** How far apart they are, above 0 or 0, in the unit of what was used; plain decimal text. */
  difference: string
  unit: UnitCode
  /** The same as a share of what was planned, percent, plain decimal text. */
  percent: string
}

interface Amount { value: string; unit: UnitCode }

/**
 * What was really taken against what the sheet worked out.
 * @returns null where one is by volume and the other by mass, or nothing was planned.
 * @throws {RangeError} if a value is no plain decimal.
 */
export function usedAgainstPlanned(used: Amount, planned: Amount): UsedAgainstPlanned | null {
  if (dimensionOf(used.unit) !== dimensionOf(planned.unit)) return null
  const taken = siValue(readDecimal(used.value), used.unit)
  const meant = siValue(readDecimal(planned.value), planned.unit)
  if (meant.lte(0)) return null
  const apart = taken.minus(meant)
  const [numerator, denominator] = UNITS[used.unit].toSi
  return {
    direction: apart.gt(0) ? 'more' : apart.lt(0) ? 'less' : 'same',
    difference: writeDecimal(apart.abs().times(denominator).div(numerator)),
    unit: used.unit,
    percent: writeDecimal(apart.abs().times(new ExactDecimal(100)).div(meant)),
  }
}
