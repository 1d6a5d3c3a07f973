import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { jobsOfBlock } from '../../../shared/rounds/jobsOfBlock.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { MOST_PLAN_DAYS } from '../../../shared/contract/seasonPlan.ts'
import { toDayNumber } from '../../../shared/time/dayNumber.ts'
import { numberOf } from '../record/recordContent.ts'
import { useFigures } from '../app/useFigures.ts'
import type { StepDraft } from './usePlanForm.ts'

/** What a step comes to when every round is done on its day; empty until its days can be read. */
export function useStepPreview(step: () => StepDraft): ComputedRef<string> {
  const { t } = useI18n()
  const { dayShort } = useFigures()
  return computed(() => {
    const { firstOn, lastOn, everyDays, blockIds } = step()
    const every = Number(numberOf(everyDays) || 0)
    if (firstOn === null || lastOn === null || !Number.isInteger(every) || every < 1 || lastOn < firstOn || toDayNumber(lastOn) - toDayNumber(firstOn) >= MOST_PLAN_DAYS) return ''
    const rhythm = { firstOn, lastOn, everyDays: every, earlyDays: 0, lateDays: 0 }
    const jobs = jobsOfBlock({ rhythm, works: [], decisions: [], today: addDays(firstOn, -1), isClosed: false })
    const blocks = t('rounds.form.blockCount', { count: blockIds.length }, blockIds.length)
    return t('rounds.form.preview', { rounds: jobs.length, blocks, fromOn: dayShort(firstOn), toOn: dayShort(jobs.at(-1)?.targetOn ?? firstOn) }, jobs.length)
  })
}
