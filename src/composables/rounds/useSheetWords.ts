import { useI18n } from 'vue-i18n'
import type { Job } from '../../../shared/contract/job.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { useFigures } from '../app/useFigures.ts'
import type { SheetRow, SheetWork } from './useSeasonSheet.ts'

/** What is on one block on one day. */
export interface SheetCell { jobs: Job[]; works: SheetWork[]; held: SheetWork[]; isPicking: boolean }

/** What meets a day: jobs that may be done on it or are planned for it, work, what holds it. */
export function cellOf({ jobs, works, harvests }: Pick<SheetRow, 'jobs' | 'works' | 'harvests'>, day: string): SheetCell {
  return {
    jobs: jobs.filter(({ state, done, earliestOn, latestOn, plannedOn }) => (state === 'done' ? done?.on === day : (earliestOn <= day && day <= latestOn) || plannedOn === day)),
    works: works.filter(({ on }) => on === day),
    held: works.filter(({ on, heldTo }) => heldTo !== null && on <= day && day <= heldTo),
    isPicking: harvests.some(({ from, to }) => from <= day && day <= to),
  }
}

/** Cells and jobs in the person's language. */
export function useSheetWords(): {
  day: (civilDate: string) => string
  window: (job: Job) => string
  job: (job: Job) => string
  /** One cell as one sentence. */
  cell: (row: SheetRow, day: string, today: string | null) => string
} {
  const { t } = useI18n()
  const { language, dayShort } = useFigures()
  const day = (civilDate: string): string => formatDay(language.value, civilDate, { weekday: true, year: false })
  const method = (job: Pick<Job, 'method'>): string => t(`frame.method.${job.method}`)
  const job = (one: Job): string => t('rounds.cell.job', {
    preparation: one.preparation, method: method(one), state: t(`rounds.state.${one.state}`), from: dayShort(one.earliestOn), to: dayShort(one.latestOn),
  })

  function cell(row: SheetRow, civilDate: string, today: string | null): string {
    const { jobs, works, held, isPicking } = cellOf(row, civilDate)
    const code = row.block.code
    const things = [
      ...(civilDate === today ? [t('rounds.cell.today')] : []),
      ...jobs.filter(({ state }) => state !== 'done').map(job),
      ...works.map((work) => t('rounds.cell.work', { preparation: work.preparations.join(', '), method: method(work), number: work.number })),
      ...held.map((work) => t('rounds.cell.hold', { day: dayShort(work.pickFrom ?? addDays(work.heldTo ?? work.on, 1)) })),
      ...(isPicking ? [t('rounds.cell.harvest')] : []),
    ]
    return things.length === 0 ? t('rounds.cell.empty', { code, day: day(civilDate) }) : t('rounds.cell.says', { code, day: day(civilDate), things: things.join('; ') })
  }
  return { day, job, cell, window: (one) => t('rounds.job.window', { from: dayShort(one.earliestOn), to: dayShort(one.latestOn) }) }
}
