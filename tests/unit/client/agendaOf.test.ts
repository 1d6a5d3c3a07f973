import { expect, it } from 'vitest'
import type { Job } from '../../../shared/contract/job.ts'
import { agendaOf } from '../../../src/composables/rounds/agendaOf.ts'
import { sheetStep } from '../../../src/composables/rounds/sheetStep.ts'

const job = (blockCode: string, state: Job['state'], plannedOn: string, change: Partial<Job> = {}): Job => ({
  id: blockCode, planId: 'p', stepId: 's1', blockId: blockCode, number: 1, method: 'foliar', materialId: 'm', preparation: 'Nettle', blockCode, targetOn: plannedOn,
  earliestOn: plannedOn, latestOn: plannedOn, plannedOn, isMoved: false, state, done: null, skip: null, openRecordId: null, revision: 0, ...change,
})
const codes = (groups: { jobs: Job[] }[]): string[][] => groups.map(({ jobs }) => jobs.map(({ blockCode }) => blockCode))

it('puts what is late first, a due job whose day has passed under today, and one step of a day together', () => {
  const { late, days, settled } = agendaOf([
    job('A1', 'late', '2026-06-01'), job('A2', 'due', '2026-06-14'), job('A3', 'due', '2026-06-16'), job('A4', 'planned', '2026-06-20', { stepId: 's2' }),
    job('A5', 'planned', '2026-09-20'), job('B1', 'done', '2026-06-01', { done: { recordId: 'r', number: '2026-0001', on: '2026-06-15' } }), job('B2', 'skipped', '2026-05-01'),
  ], '2026-06-16')
  expect(codes(late)).toEqual([['A1']])
  expect(days.map(({ day, groups }) => [day, codes(groups)])).toEqual([['2026-06-16', [['A2', 'A3']]], ['2026-06-20', [['A4']]]])
  expect(codes(settled)).toEqual([['B1']])
})

it.each([
  [{ key: 'ArrowLeft', shiftKey: false }, { row: 1, day: 9 }], [{ key: 'ArrowRight', shiftKey: true }, { row: 1, day: 17 }], [{ key: 'ArrowUp', shiftKey: false }, { row: 0, day: 10 }],
  [{ key: 'PageDown', shiftKey: false }, { row: 2, day: 10 }], [{ key: 'Home', shiftKey: false }, { row: 1, day: 0 }], [{ key: 'End', shiftKey: false }, { row: 1, day: 364 }],
  [{ key: 't', shiftKey: false }, { row: 1, day: 100 }], [{ key: 'x', shiftKey: false }, null],
])('walks the sheet by %o', (key, place) => {
  expect(sheetStep({ row: 1, day: 10 }, key, { rows: 3, days: 365, today: 100 })).toEqual(place)
})
