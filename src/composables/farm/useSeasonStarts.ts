import { computed, toValue, type ComputedRef, type MaybeRefOrGetter } from 'vue'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { usePreferences } from '../../stores/preferences.ts'

const MONTHS = ['01', '02', '03', '04', '05', '06', '07', '08', '09', '10', '11', '12']
/** A year without a leap day: only day and month are shown. */
const ANY_YEAR = 2001

/** Days on which a season may begin: the first of each month, and the day it begins on now. */
export function useSeasonStarts(now: MaybeRefOrGetter<string | null> = null): ComputedRef<{ value: string; label: string }[]> {
  const preferences = usePreferences()
  return computed(() => {
    const kept = toValue(now)
    const days = new Set([...MONTHS.map((month) => `${month}-01`), ...(kept === null ? [] : [kept])])
    return [...days].sort().map((value) => ({ value, label: formatDay(preferences.language, `${ANY_YEAR}-${value}`, { year: false }) }))
  })
}
