import { expect, it } from 'vitest'
import type { Job } from '../../../../shared/contract/job.ts'
import { asKept } from '../../../../src/composables/rounds/useSeasonSheet.ts'

const job: Job = {
  id: 's.b.1', planId: 'p', stepId: 's', blockId: 'b', number: 1, method: 'foliar', materialId: 'm', preparation: 'Nettle ferment', blockCode: 'A3',
  targetOn: '2026-06-16', earliestOn: '2026-06-14', latestOn: '2026-06-18', plannedOn: '2026-06-17', isMoved: true, state: 'due', done: null, skip: null, openRecordId: null, revision: 1,
}

const here = { today: '2026-06-16', by: { id: 'p1', name: 'Ada Rook' } }

it('shows a job on the day to which this device moved it, in the window and state that the farm knows', () => {
  expect(asKept(job, { to: '2026-06-18' }, here)).toMatchObject({ plannedOn: '2026-06-18', isMoved: true, isKept: true, state: 'due', latestOn: '2026-06-18' })
})

it('shows a job that goes back to its target there, and leaves alone what waits for nothing', () => {
  expect(asKept(job, { to: null }, here)).toMatchObject({ plannedOn: '2026-06-16', isMoved: false, isKept: true })
  expect(asKept(job, undefined, here)).toEqual({ ...job, isKept: false })
})

it('shows a job that this device skipped as skipped, and by whom', () => {
  expect(asKept(job, { skip: 'Rain' }, here)).toMatchObject({ state: 'skipped', skip: { reason: 'Rain', by: here.by }, isKept: true, plannedOn: '2026-06-17' })
})

it.each([
  ['2026-06-13', 'planned'], ['2026-06-14', 'due'], ['2026-06-18', 'due'], ['2026-06-19', 'late'],
])('shows a job whose skip was taken back here on %s as %s', (today, state) => {
  const skipped: Job = { ...job, state: 'skipped', skip: { reason: 'Rain', by: here.by, at: '2026-06-15T08:00:00Z' } }
  expect(asKept(skipped, { skip: null }, { ...here, today })).toMatchObject({ state, skip: null, isKept: true })
})
