import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { now } from '../../plugins/clock.ts'
import type { RecordDraft } from './recordDraft.ts'
import { useFigures } from '../app/useFigures.ts'

/** Since when the draft is here, or the work going on, in words. */
export function useRecordSince({ draft, begunAt, zone }: { draft: Ref<RecordDraft>; begunAt: Ref<string | null>; zone: Ref<string> }): ComputedRef<string> {
  const { t } = useI18n()
  const { day } = useFigures()
  return computed(() => {
    const started = draft.value.lines.find(({ start }) => start.time !== '')?.start.time
    if (draft.value.revision !== null && started !== undefined) return t('records.startedSince', { time: started })
    if (begunAt.value === null) return t('records.draftNew')
    const begunOn = civilDateIn(zone.value, begunAt.value)
    const time = civilTimeIn(zone.value, begunAt.value)
    const isToday = begunOn === civilDateIn(zone.value, now().toISOString())
    return isToday ? t('records.draftSince', { time }) : t('records.draftSinceDay', { day: day(begunOn), time })
  })
}
