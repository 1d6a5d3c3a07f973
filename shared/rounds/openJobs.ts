import type { JobState } from './jobsOfBlock.ts'

interface OpenJob { state: JobState; latestOn: string; plannedOn: string }

/** Of jobs, those that wait, late ones first and each kind by its last day, and after them the next that is planned. */
export function openJobs<Job extends OpenJob>(jobs: readonly Job[]): Job[] {
  const of = (state: JobState, day: (job: Job) => string): Job[] => jobs.filter((job) => job.state === state).sort((a, b) => day(a).localeCompare(day(b)))
  const lastDay = ({ latestOn }: Job): string => latestOn
  return [...of('late', lastDay), ...of('due', lastDay), ...of('planned', ({ plannedOn }) => plannedOn).slice(0, 1)]
}
