import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { LATE_HOURS } from '../../../shared/records/registerRow.ts'
import { endMoment } from './lineDraft.ts'
import { instantOf } from './recordContent.ts'
import { writtenLines, type RecordDraft } from './recordDraft.ts'
import { useClock } from '../app/useClock.ts'

const HOUR_MS = 3_600_000

/** That the record is signed more than a day after the work ended, in words; empty where it is not. */
export function useLateEntry({ draft, zone }: { draft: Ref<RecordDraft>; zone: Ref<string> }): ComputedRef<string> {
  const { t } = useI18n()
  const { time } = useClock()
  return computed(() => {
    const ends = writtenLines(draft.value).map((line) => instantOf(endMoment(line), zone.value))
    const last = Math.max(...ends.map((end) => (end?.ok ? Date.parse(end.instant) : Number.NaN)))
    const hours = Math.floor((time.value.getTime() - last) / HOUR_MS)
    // Where nothing has ended yet there is no hour to be late by.
    return Number.isFinite(hours) && hours >= LATE_HOURS ? t('recordForm.late', { hours }) : ''
  })
}
