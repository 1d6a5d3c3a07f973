import { convertQuantity } from '../units/convertQuantity.ts'
import { decimalTextOf } from '../units/decimalTextOf.ts'
import type { UnitSystem } from '../units/readingUnit.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { niceScaleBar } from './projectToPlan.ts'

/** How long a bar is, metres, and the round figure that stands at its end. */
export interface ScaleBar { metres: number; value: number; unit: UnitCode }

const BAR_UNITS = { metric: ['m', 'km'], us: ['ft', 'mi'] } as const satisfies Record<UnitSystem, readonly [UnitCode, UnitCode]>

/**
 * The longest round bar that fits into a length, in metres or kilometres, or in feet or miles once there is room for one.
 * @param roomM metres, above 0. @throws {RangeError} if there is no room.
 */
export function scaleBar(roomM: number, system: UnitSystem): ScaleBar {
  const [near, far] = BAR_UNITS[system]
  const inUnit = (unit: UnitCode): number => Number(convertQuantity({ value: decimalTextOf(roomM), unit: 'm' }, unit))
  const unit = inUnit(far) >= 1 ? far : near
  const value = niceScaleBar(inUnit(unit))
  return { value, unit, metres: Number(convertQuantity({ value: decimalTextOf(value), unit }, 'm')) }
}
