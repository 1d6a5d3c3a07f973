import { dimensionOf } from './dimensionOf.ts'
import { ExactDecimal, readDecimal, writeDecimal } from './exactDecimal.ts'
import { UNITS, type UnitCode } from './unitTable.ts'

export interface Quantity {
  /** Plain decimal text. */
  value: string
  unit: UnitCode
}

/**
 * A quantity in another unit of its dimension, worked with 40 digits from the defining constants.
 * @returns plain decimal text of at most 15 significant digits, in `to`.
 * @throws {RangeError} if a unit is not known, the value is no plain decimal, or the two measure different things.
 * @source see `UNITS`.
 * @example convertQuantity({ value: '1', unit: 'galUS' }, 'L') // '3.785411784'
 */
export function convertQuantity({ value, unit }: Quantity, to: UnitCode): string {
  const dimension = dimensionOf(unit)
  const wanted = dimensionOf(to)
  if (dimension !== wanted) throw new RangeError(`${unit} is ${dimension}, ${to} is ${wanted}`)
  const amount = readDecimal(value)
  if (unit === to) return writeDecimal(amount)
  const source = UNITS[unit]
  const target = UNITS[to]
  // Multiply first, divide once: the only rounding is the last division's.
  const numerator = new ExactDecimal(source.toSi[0]).times(target.toSi[1])
  const denominator = new ExactDecimal(source.toSi[1]).times(target.toSi[0])
  return writeDecimal(amount.plus(source.offset).times(numerator).div(denominator).minus(target.offset))
}
