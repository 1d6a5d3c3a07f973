import { expect, it } from 'vitest'
import type { Job } from '../../../../shared/contract/job.ts'
import { asKept } from '../../../../src/composables/useSeasonSheet.ts'

const job: Job = {
  id: 's.b.1', planId: 'p', stepId: 's', blockId: 'b', number: 1, method: 'foliar', materialId: 'm', preparation: 'Nettle ferment', blockCode: 'A3',
  targetOn: '2026-06-16', earliestOn: '2026-06-14', latestOn: '2026-06-18', plannedOn: '2026-06-17', isMoved: true, state: 'due', done: null, skip: null, openRecordId: null, revision: 1,
}

it('shows a job on the day to which this device moved it, in the window and state that the farm knows', () => {
  expect(asKept(job, '2026-06-18')).toMatchObject({ plannedOn: '2026-06-18', isMoved: true, isKept: true, state: 'due', latestOn: '2026-06-18' })
})

it('shows a job that goes back to its target there, and leaves alone what waits for nothing', () => {
  expect(asKept(job, null)).toMatchObject({ plannedOn: '2026-06-16', isMoved: false, isKept: true })
  expect(asKept(job, undefined)).toEqual({ ...job, isKept: false })
})
