import { describe, expect, it } from 'vitest'
import { openJobs } from '../../../shared/rounds/openJobs.ts'
import type { JobState } from '../../../shared/rounds/jobsOfBlock.ts'

const job = (id: string, state: JobState, latestOn: string, plannedOn = latestOn) => ({ id, state, latestOn, plannedOn })

describe('the jobs of a block that are still to be done', () => {
  it('stand late ones first, each kind by its last day, then the next planned one alone', () => {
    const jobs = [
      job('planned later', 'planned', '2026-07-20'), job('planned next', 'planned', '2026-07-30', '2026-07-01'), job('due', 'due', '2026-06-18'),
      job('late since long', 'late', '2026-06-01'), job('late', 'late', '2026-06-14'), job('done', 'done', '2026-05-01'), job('skipped', 'skipped', '2026-05-20'),
    ]
    expect(openJobs(jobs).map(({ id }) => id)).toEqual(['late since long', 'late', 'due', 'planned next'])
  })

  it('are none where everything was done or skipped', () => {
    expect(openJobs([job('done', 'done', '2026-05-01'), job('skipped', 'skipped', '2026-05-20')])).toEqual([])
  })
})
