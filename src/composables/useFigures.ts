import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { formatDay } from '../../shared/messages/formatDay.ts'
import { formatDayShort } from '../../shared/messages/formatDayShort.ts'
import type { Language } from '../../shared/messages/translate.ts'
import { formatHectares, formatNumber, formatRate } from '../../shared/units/formatQuantity.ts'
import { usePreferences } from '../stores/preferences.ts'

type Figure = string | number | null

/** Decimals by which amounts of one account line up: 791.3, 37.50, 0.800. */
function digitsOf(value: string | number): number {
  const size = Number(value)
  if (size >= 100) return 1
  return size >= 1 ? 2 : 3
}

/** Figures, days and units in the person's language; nothing known gives an empty text. */
export function useFigures(): {
  language: ComputedRef<Language>
  /** An amount of an account: 791.3, 37.50, 0.800. */
  amount: (value: Figure) => string
  /** The same with its litres: "791.3 L". */
  litres: (value: Figure) => string
  /** At most four significant digits. */
  rate: (value: Figure) => string
  /** As exact as it is written, at most four decimals. */
  plain: (value: Figure) => string
  /** With so many decimals. */
  fixed: (value: Figure, digits: number) => string
  hectares: (areaM2: Figure) => string
  unit: (code: string) => string
  units: (codes: readonly string[]) => { value: string; label: string }[]
  day: (civilDate: string) => string
  dayShort: (civilDate: string) => string
} {
  const { t } = useI18n()
  const preferences = usePreferences()
  const language = computed(() => preferences.language)
  const unless = (value: Figure, words: (known: string | number) => string): string => (value === null || value === '' ? '' : words(value))
  const unit = (code: string): string => t(`units.${code}`)
  const amount = (value: Figure): string => unless(value, (known) => formatNumber(known, { digits: digitsOf(known) }, language.value))
  return {
    language,
    amount,
    litres: (value) => unless(value, (known) => `${amount(known)}\u00A0${unit('L')}`),
    rate: (value) => unless(value, (known) => formatRate(known, language.value)),
    plain: (value) => unless(value, (known) => formatNumber(known, {}, language.value)),
    fixed: (value, digits) => unless(value, (known) => formatNumber(known, { digits }, language.value)),
    hectares: (areaM2) => unless(areaM2, (known) => formatHectares(known, language.value)),
    unit,
    units: (codes) => codes.map((value) => ({ value, label: unit(value) })),
    day: (civilDate) => formatDay(language.value, civilDate, { year: false }),
    dayShort: (civilDate) => formatDayShort(language.value, civilDate),
  }
}
