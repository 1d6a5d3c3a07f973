import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import { now } from '../../plugins/clock.ts'
import { endMoment, momentAt } from './lineDraft.ts'
import { instantOf } from './recordContent.ts'
import { writtenLines, type RecordDraft } from './recordDraft.ts'
import { useFigures } from '../app/useFigures.ts'
import type { LineRow } from './useLineRows.ts'

const MINUTE_MS = 60_000
const HOUR_MIN = 60

interface SumOptions {
  draft: Ref<RecordDraft>
  sheet: () => RecordSheet
  zone: () => string
  lines: () => readonly LineRow[]
}

/** What the lines come to: their day, how long the work took, and all that went on. */
export function useHappenedSum({ draft, sheet, zone, lines }: SumOptions): {
  day: ComputedRef<string>
  setDay: (day: string | null) => void
  lasted: ComputedRef<string>
  total: ComputedRef<string>
} {
  const { t } = useI18n()
  const { mass, volume } = useFigures()
  const day = computed(() => draft.value.lines.find(({ start }) => start.date !== '')?.start.date ?? momentAt(zone(), now().toISOString()).date)

  /** A line that was worked on another day than the first keeps its own. */
  function setDay(next: string | null): void {
    if (next === null) return
    const before = day.value
    for (const line of draft.value.lines) if (line.start.date === '' || line.start.date === before) line.start.date = next
  }

  const lasted = computed(() => {
    const read = writtenLines(draft.value).map((line) => ({ start: instantOf(line.start, zone()), end: instantOf(endMoment(line), zone()) }))
    const starts = read.flatMap(({ start }) => (start?.ok ? [Date.parse(start.instant)] : []))
    const ends = read.flatMap(({ end }) => (end?.ok ? [Date.parse(end.instant)] : []))
    const minutes = Math.round((Math.max(...ends) - Math.min(...starts)) / MINUTE_MS)
    if (!Number.isFinite(minutes) || minutes < 0) return ''
    return minutes < HOUR_MIN
      ? t('records.happened.lastedMinutes', { minutes })
      : t('records.happened.lasted', { hours: Math.floor(minutes / HOUR_MIN), minutes: minutes % HOUR_MIN })
  })

  /** Each line by what was written of it, else by its share. */
  const total = computed(() => {
    const { totalL, lines: figures } = sheet()
    const isVolume = totalL !== null
    let sum = new ExactDecimal(0)
    for (const { index } of lines()) {
      if (index < 0) continue
      const figure = figures[index]
      const one = isVolume ? (figure?.amountL ?? figure?.shareL) : (figure?.amountKg ?? figure?.shareKg)
      if (!one) return ''
      sum = sum.plus(one)
    }
    return sum.isZero() ? '' : isVolume ? volume(sum.toFixed()) : mass(sum.toFixed())
  })

  return { day, setDay, lasted, total }
}
