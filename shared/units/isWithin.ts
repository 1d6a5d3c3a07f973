import { convertQuantity, type Quantity } from './convertQuantity.ts'
import type { UnitCode } from './unitTable.ts'

/**
 * True where a quantity lies between two ends, both taken in, compared in the unit of the ends.
 * @throws {RangeError} if its value is no plain decimal or the units measure different things.
 */
export function isWithin(quantity: Quantity, ends: { low: number; high: number; unit: UnitCode }): boolean {
  const value = Number(convertQuantity(quantity, ends.unit))
  return value >= ends.low && value <= ends.high
}
