import { ExactDecimal } from './exactDecimal.ts'
import { M2_PER_HA } from './hectare.ts'

export type NumberLocale = 'en' | 'es'
/** `digits`: exactly so many decimals. `significant`: at most so many significant digits. Neither: at most four decimals. */
export interface Rounding { digits?: number; significant?: number }

const GROUP = '\u00A0'
const MINUS = '\u2212'

/**
 * A number for reading, rounded half up; the one place where figures are rounded for display.
 * Thousands are parted by U+00A0, below zero stands U+2212, the decimal mark is the language's.
 * @param value plain decimal text or a finite number.
 * @throws {RangeError} if the value is not a finite number.
 */
export function formatNumber(value: string | number, { digits, significant }: Rounding, locale: NumberLocale): string {
  const exact = readFinite(value)
  const text = digits !== undefined
    ? exact.toFixed(digits)
    : (significant !== undefined ? exact.toSignificantDigits(significant) : exact.toDecimalPlaces(4)).toFixed()
  const [whole = '', decimals] = text.replace('-', '').split('.')
  const grouped = whole.replace(/\B(?=(?:\d{3})+$)/g, GROUP)
  const mark = locale === 'es' ? ',' : '.'
  const isNegative = text.startsWith('-') && /[1-9]/.test(text)
  return `${isNegative ? MINUS : ''}${grouped}${decimals === undefined ? '' : mark + decimals}`
}

/**
 * An area as a figure in hectares, without its unit.
 * @param areaM2 square metres.
 * @param digits decimals, 0 to 4 (0.0001 ha is 1 m²; a boundary is drawn no better).
 */
export function formatHectares(areaM2: string | number, locale: NumberLocale, digits = 2): string {
  const areaHa = readFinite(areaM2).div(M2_PER_HA).toFixed()
  return formatNumber(areaHa, { digits: Math.min(Math.max(digits, 0), 4) }, locale)
}

/** A volume as a figure in litres, one decimal unless told, without its unit. */
export function formatVolumeL(litres: string | number, locale: NumberLocale, digits = 1): string {
  return formatNumber(litres, { digits }, locale)
}

/** A rate as a figure in its own unit, four significant digits unless told, without its unit. */
export function formatRate(value: string | number, locale: NumberLocale, significant = 4): string {
  return formatNumber(value, { significant }, locale)
}

function readFinite(value: string | number): InstanceType<typeof ExactDecimal> {
  const isReadable = typeof value === 'number' ? Number.isFinite(value) : /^-?\d+(\.\d+)?$/.test(value)
  if (!isReadable) throw new RangeError(`not a finite number: ${String(value).slice(0, 80)}`)
  return new ExactDecimal(value)
}
