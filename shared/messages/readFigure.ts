import { convertQuantity } from '../units/convertQuantity.ts'
import { decimalTextOf } from '../units/decimalTextOf.ts'
import { formatNumber, type Rounding } from '../units/formatQuantity.ts'
import { readingUnit, type UnitSystem } from '../units/readingUnit.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { translate, type Language } from './translate.ts'

/** Who reads: their language, and the measures they read figures in. */
export interface Reader { language: Language; units: UnitSystem }

const textOf = (value: string | number): string => (typeof value === 'number' ? decimalTextOf(value) : value)

/**
 * A figure that was worked out in a unit, as plain decimal text of the unit that a reader reads it in: not rounded.
 * @throws {RangeError} if the value is no plain decimal or no finite number.
 */
export function figureIn(value: string | number, unit: UnitCode, system: UnitSystem): string {
  return convertQuantity({ value: textOf(value), unit }, readingUnit(unit, system))
}

/** The words of the unit in which a reader reads a figure: "acre" for `ha`. */
export function unitFor({ language, units }: Reader, unit: UnitCode): string {
  return translate(language, `units.${readingUnit(unit, units)}`)
}

/** A worked-out figure in the reader's measures and language, rounded here and only here, without its unit. */
export function figureFor({ language, units }: Reader, value: string | number, unit: UnitCode, rounding: Rounding): string {
  return formatNumber(figureIn(value, unit, units), rounding, language)
}

/** The same with its unit: "414 m" or "1 358 ft". */
export function quantityFor(reader: Reader, value: string | number, unit: UnitCode, rounding: Rounding): string {
  return `${figureFor(reader, value, unit, rounding)}\u00A0${unitFor(reader, unit)}`
}

/** A figure as exact as it is written where the reader reads its unit, else to four significant digits; without its unit. */
export function storedFor(reader: Reader, value: string | number, unit: UnitCode): string {
  return figureFor(reader, value, unit, readingUnit(unit, reader.units) === unit ? {} : { significant: 4 })
}

/** Ground as a figure in hectares or acres, to two decimals unless told, without its unit. @param areaM2 square metres. */
export function areaFor({ language, units }: Reader, areaM2: string | number, digits = 2): string {
  return formatNumber(convertQuantity({ value: textOf(areaM2), unit: 'm2' }, readingUnit('ha', units)), { digits }, language)
}
