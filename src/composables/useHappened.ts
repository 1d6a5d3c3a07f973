import { computed, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { now } from '../plugins/clock.ts'
import { endDate } from './endDate.ts'
import { instantOf } from './recordContent.ts'
import { momentAt, type RecordDraft } from './recordDraft.ts'

/** A clock time that was shown twice, with the two offsets to choose from. */
export interface TwiceShown {
  at: 'start' | 'end'
  words: string
  options: { value: string; label: string }[]
}

const MINUTE_MS = 60_000
const HOUR_MIN = 60

/** When it happened, on the farm's clock: times that did not exist or came twice are said in words, never guessed. */
export function useHappened(draft: Ref<RecordDraft>, zone: Ref<string>): {
  setNow: (at: 'start' | 'end') => void
  isOvernight: ComputedRef<boolean>
  lasted: ComputedRef<string>
  twice: ComputedRef<TwiceShown[]>
  nonexistent: ComputedRef<{ start: string; end: string }>
} {
  const { t } = useI18n()
  const read = computed(() => ({ start: instantOf(draft.value.start, zone.value), end: instantOf(draft.value.end, zone.value) }))

  // Work is written down on its day more often than not.
  if (draft.value.start.date === '') draft.value.start.date = momentAt(zone.value, now().toISOString()).date
  // The end has no date of its own to choose: it is the day of the start, or the night after it.
  watch(() => [draft.value.start.date, draft.value.start.time, draft.value.end.time] as const, () => {
    const date = endDate(draft.value.start, draft.value.end.time)
    if (draft.value.end.date !== date) draft.value.end.date = date
  }, { immediate: true })
  // An offset is an answer about one time; another time asks again.
  for (const at of ['start', 'end'] as const) {
    watch(() => `${draft.value[at].date} ${draft.value[at].time}`, () => {
      const moment = { ...draft.value[at], offset: '' }
      if (instantOf(moment, zone.value)?.ok) draft.value[at].offset = ''
    })
  }

  function setNow(at: 'start' | 'end'): void {
    const moment = momentAt(zone.value, now().toISOString())
    if (at === 'start' || draft.value.start.date === '') draft.value.start = at === 'start' ? moment : { ...draft.value.start, date: moment.date }
    if (at === 'end') draft.value.end = moment
  }

  const twice = computed(() => (['start', 'end'] as const).flatMap((at) => {
    const moment = draft.value[at]
    const asked = instantOf({ ...moment, offset: '' }, zone.value)
    if (asked === null || asked.ok || asked.problem.id !== 'time.ambiguous') return []
    const labels = [t('records.happened.twiceFirst'), t('records.happened.twiceSecond')]
    return [{
      at, words: t('records.happened.twice', { time: moment.time }),
      options: asked.candidates.map(({ offset }, index) => ({ value: offset, label: labels[index] ?? offset })),
    }]
  }))
  const nonexistentWords = (at: 'start' | 'end'): string => {
    const one = read.value[at]
    return one !== null && !one.ok && one.problem.id === 'time.nonexistent' ? t('records.happened.nonexistent', { time: draft.value[at].time }) : ''
  }

  return {
    setNow,
    isOvernight: computed(() => draft.value.end.date !== '' && draft.value.end.date !== draft.value.start.date),
    lasted: computed(() => {
      const { start, end } = read.value
      if (!start?.ok || !end?.ok) return ''
      const minutes = Math.round((Date.parse(end.instant) - Date.parse(start.instant)) / MINUTE_MS)
      if (minutes < 0) return ''
      return minutes < HOUR_MIN
        ? t('records.happened.lastedMinutes', { minutes })
        : t('records.happened.lasted', { hours: Math.floor(minutes / HOUR_MIN), minutes: minutes % HOUR_MIN })
    }),
    twice,
    nonexistent: computed(() => ({ start: nonexistentWords('start'), end: nonexistentWords('end') })),
  }
}
