import { UNITS, type Dimension, type UnitCode } from './unitTable.ts'

/**
 * What a unit measures.
 * @throws {RangeError} if the unit is not one of `UNITS`.
 */
export function dimensionOf(unit: string): Dimension {
  if (!Object.hasOwn(UNITS, unit)) throw new RangeError(`unit not known: ${unit.slice(0, 80)}`)
  return UNITS[unit as UnitCode].dimension
}
