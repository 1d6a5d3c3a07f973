import { computed, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { now } from '../../plugins/clock.ts'
import { endAt, endMoment, momentAt, type LineDraft, type MomentDraft } from './lineDraft.ts'
import { instantOf } from './recordContent.ts'

/** A clock time that was shown twice, with the two offsets to choose from. */
interface TwiceShown {
  at: 'start' | 'end'
  words: string
  options: { value: string; label: string }[]
}

interface LineTimes {
  setNow: (at: 'start' | 'end') => void
  /** The end shows an earlier time than the start, and nobody has said which day it was. */
  asksNextDay: ComputedRef<boolean>
  saidNextDay: () => void
  twice: ComputedRef<TwiceShown[]>
  nonexistent: ComputedRef<{ start: string; end: string }>
}

/** Writes this moment as the start or the end of a line; the day comes with it. */
export function setLineNow(line: LineDraft, at: 'start' | 'end', zone: string): void {
  const instant = now().toISOString()
  if (at === 'start') line.start = momentAt(zone, instant)
  else line.end = endAt(zone, instant, line.start.date)
}

/** When the work on one line happened, on the farm's clock: what is doubtful about a time is asked in words, never guessed. */
export function useLineTimes(line: Ref<LineDraft>, zone: Ref<string>): LineTimes {
  const { t } = useI18n()
  const today = (): string => momentAt(zone.value, now().toISOString()).date
  const moments = computed(() => ({ start: line.value.start, end: endMoment(line.value) }))

  // Work is written down on its day more often than not.
  if (line.value.start.date === '') line.value.start.date = today()
  // The next day is an answer about one pair of times; an end that comes after the start asks nothing.
  watch(() => [line.value.start.time, line.value.end.time] as const, ([start, end]) => {
    if (start !== '' && end !== '' && end >= start) line.value.end.nextDay = false
  })
  // An offset is an answer about one time; another time asks again.
  for (const at of ['start', 'end'] as const) {
    watch(() => `${moments.value[at].date} ${moments.value[at].time}`, () => {
      if (instantOf({ ...moments.value[at], offset: '' }, zone.value)?.ok) line.value[at].offset = ''
    })
  }


  const nonexistentWords = (moment: MomentDraft): string => {
    const read = instantOf(moment, zone.value)
    return read !== null && !read.ok && read.problem.id === 'time.nonexistent' ? t('records.happened.nonexistent', { time: moment.time }) : ''
  }

  return {
    setNow: (at) => { setLineNow(line.value, at, zone.value) },
    asksNextDay: computed(() => {
      const { start, end } = line.value
      return start.time !== '' && end.time !== '' && end.time < start.time && !end.nextDay
    }),
    saidNextDay: () => { line.value.end.nextDay = true },
    twice: computed(() => (['start', 'end'] as const).flatMap((at) => {
      const moment = moments.value[at]
      const asked = instantOf({ ...moment, offset: '' }, zone.value)
      if (asked === null || asked.ok || asked.problem.id !== 'time.ambiguous') return []
      const labels = [t('records.happened.twiceFirst'), t('records.happened.twiceSecond')]
      return [{
        at, words: t('records.happened.twice', { time: moment.time }),
        options: asked.candidates.map(({ offset }, index) => ({ value: offset, label: labels[index] ?? offset })),
      }]
    })),
    nonexistent: computed(() => ({ start: nonexistentWords(moments.value.start), end: nonexistentWords(moments.value.end) })),
  }
}
