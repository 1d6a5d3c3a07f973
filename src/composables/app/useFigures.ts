import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { areaFor, figureIn, storedFor, unitFor, type Reader } from '../../../shared/messages/readFigure.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { formatNumber, type Rounding } from '../../../shared/units/formatQuantity.ts'
import { unitsInOrder } from '../../../shared/units/readingUnit.ts'
import type { UnitCode } from '../../../shared/units/unitTable.ts'
import { usePreferences } from '../../stores/preferences.ts'

type Figure = string | number | null

/** Decimals by which amounts of one account line up: 791.3, 37.50, 0.800. */
function digitsOf(value: string | number): number {
  const size = Number(value)
  if (size >= 100) return 1
  return size >= 1 ? 2 : 3
}

/**
 * Figures, days and units as the person reads them; nothing known gives an empty text. A figure that was worked out names the unit it was
 * worked out in and is read in the person's own measures, whose words are `unitOf`; what somebody typed names none and stays as it is.
 */
export function useFigures(): {
  language: ComputedRef<Language>
  reader: ComputedRef<Reader>
  /** An amount of an account: 791.3, 37.50, 0.800. */
  amount: (value: Figure, workedOutIn?: UnitCode) => string
  /** A volume worked out in litres, with its unit: "791.3 L" or "209.0 US gal". */
  volume: (litres: Figure) => string
  /** A mass worked out in kilograms, with its unit. */
  mass: (kilograms: Figure) => string
  /** At most four significant digits. */
  rate: (value: Figure, workedOutIn?: UnitCode) => string
  /** A spray rate: whole from 100 up, else four digits. */
  perHa: (value: number, workedOutIn: 'L/ha' | 'kg/ha') => string
  /** As exact as it is written, at most four decimals; in other measures to four significant digits. */
  plain: (value: Figure, workedOutIn?: UnitCode) => string
  /** With so many decimals. */
  fixed: (value: Figure, digits: number, workedOutIn?: UnitCode) => string
  /** Hectares or acres, to two decimals; `unitOf('ha')` are their words. */
  area: (areaM2: Figure) => string
  /** The words of a unit as it is written. */
  unit: (code: string) => string
  /** The words of the unit in which this person reads what was worked out in another. */
  unitOf: (workedOutIn: UnitCode) => string
  /** Units to choose from, the person's own measures first. */
  units: (codes: readonly string[]) => { value: string; label: string }[]
  day: (civilDate: string) => string
  dayShort: (civilDate: string) => string
} {
  const { t } = useI18n()
  const preferences = usePreferences()
  const language = computed(() => preferences.language)
  const unit = (code: string): string => t(`units.${code}`)
  const unitOf = (code: UnitCode): string => unitFor(preferences.reader, code)

  function words(value: Figure, workedOutIn: UnitCode | undefined, rounding: (read: string | number) => Rounding): string {
    if (value === null || value === '') return ''
    const read = workedOutIn === undefined ? value : figureIn(value, workedOutIn, preferences.units)
    return formatNumber(read, rounding(read), language.value)
  }
  const amount = (value: Figure, code?: UnitCode): string => words(value, code, (read) => ({ digits: digitsOf(read) }))
  const withUnit = (value: Figure, code: UnitCode): string => (value === null || value === '' ? '' : `${amount(value, code)}\u00A0${unitOf(code)}`)
  return {
    language, amount, unit, unitOf,
    reader: computed(() => preferences.reader),
    volume: (litres) => withUnit(litres, 'L'),
    mass: (kilograms) => withUnit(kilograms, 'kg'),
    rate: (value, code) => words(value, code, () => ({ significant: 4 })),
    perHa: (value, code) => words(value, code, (read) => (Number(read) < 100 ? { significant: 4 } : { digits: 0 })),
    plain: (value, code) => (value === null || value === '' ? '' : code === undefined ? formatNumber(value, {}, language.value) : storedFor(preferences.reader, value, code)),
    fixed: (value, digits, code) => words(value, code, () => ({ digits })),
    area: (areaM2) => (areaM2 === null || areaM2 === '' ? '' : areaFor(preferences.reader, areaM2)),
    units: (codes) => unitsInOrder(codes, preferences.units).map((value) => ({ value, label: unit(value) })),
    day: (civilDate) => formatDay(language.value, civilDate, { year: false }),
    dayShort: (civilDate) => formatDayShort(language.value, civilDate),
  }
}
