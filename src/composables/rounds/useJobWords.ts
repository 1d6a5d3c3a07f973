import { useI18n } from 'vue-i18n'
import type { Job } from '../../../shared/contract/job.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { useFigures } from '../app/useFigures.ts'

type Timed = Pick<Job, 'state' | 'latestOn' | 'plannedOn'>

/** When a job that is still to be done is to be done: "late since 15 June", "until 18 June", "Planned for 20 June". */
export function useJobWords(): { when: (job: Timed) => string } {
  const { t } = useI18n()
  const { dayShort } = useFigures()
  return {
    when: ({ state, latestOn, plannedOn }) => {
      if (state === 'planned') return t('rounds.job.plannedFor', { day: dayShort(plannedOn) })
      // Moved past its days, it is due until the day it was moved to.
      const last = plannedOn > latestOn ? plannedOn : latestOn
      return state === 'late' ? t('rounds.today.lateSince', { day: dayShort(addDays(last, 1)) }) : t('rounds.today.until', { day: dayShort(last) })
    },
  }
}
