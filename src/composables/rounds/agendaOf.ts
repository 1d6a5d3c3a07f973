import type { Job } from '../../../shared/contract/job.ts'
import { byBlock, groupBy } from '../../../shared/rounds/groupBy.ts'
import { addDays } from '../../../shared/time/calendar.ts'

/** Jobs of one day and step: what one record may be written for. */
export interface AgendaGroup { key: string; jobs: Job[] }
export interface AgendaDay { day: string; groups: AgendaGroup[] }
/** What is to be done, by its day; what is late stands before everything, today's comes with what could be done today. */
export interface Agenda { late: AgendaGroup[]; days: AgendaDay[]; settled: AgendaGroup[] }

const AHEAD_DAYS = 56
const BACK_DAYS = 14

/** Jobs as a list by day. A due job stands on its planned day, and on today once that has passed. */
export function agendaOf(jobs: readonly Job[], today: string): Agenda {
  const isIn = (job: Job, from: string, to: string): boolean => { const day = dayOf(job); return day >= from && day <= to }
  const open = jobs.filter(({ state }) => state === 'due' || state === 'planned')
  const days = groupBy(open.filter((job) => isIn(job, '0000', addDays(today, AHEAD_DAYS))), ({ plannedOn }) => (plannedOn < today ? today : plannedOn))
  const settled = jobs.filter((job) => (job.state === 'done' || job.state === 'skipped') && isIn(job, addDays(today, -BACK_DAYS), today))
  return {
    late: groupsOf(jobs.filter(({ state }) => state === 'late')),
    days: [...days].sort(([a], [b]) => a.localeCompare(b)).map(([day, those]) => ({ day, groups: groupsOf(those) })),
    settled: groupsOf(settled.toSorted((a, b) => dayOf(b).localeCompare(dayOf(a)))),
  }
}

const dayOf = ({ done, plannedOn }: Job): string => done?.on ?? plannedOn

function groupsOf(jobs: readonly Job[]): AgendaGroup[] {
  return [...groupBy(jobs, ({ stepId, state, done }) => `${stepId} ${done === null ? '' : state}`)].map(([key, those]) => ({ key, jobs: those.toSorted(byBlock) }))
}
