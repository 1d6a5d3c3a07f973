import { describe, expect, it } from 'vitest'
import { sheetPaths, type SheetMarks } from '../../../shared/season/sheetPaths.ts'
import { weekdayOf, weekOf } from '../../../shared/season/sheetDays.ts'

const SCALE = { day: 22, row: 25 }
const STRETCH = { from: '2026-06-01', days: 28 }
const marks = (change: Partial<SheetMarks>): SheetMarks => ({ works: [], jobs: [], harvests: [], ...change })
const job = (state: SheetMarks['jobs'][number]['state'], change: object = {}) =>
  ({ row: 0, method: 'foliar', state, earliestOn: '2026-06-03', latestOn: '2026-06-05', plannedOn: '2026-06-04', ...change }) as const

describe('the paths of a stretch of the season sheet', () => {
  it('have a trough from the first to the last day of a job, and its mark on its planned day', () => {
    const paths = sheetPaths(marks({ jobs: [job('due')] }), STRETCH, SCALE)
    expect(paths.due).toBe('M45 6V21H109V6')
    expect(paths.foliarPlanned).toMatch(/^M72\.4 12\.5a/)
    expect([paths.planned, paths.late, paths.skipped, paths.foliar]).toEqual(['', '', '', ''])
  })

  it.each([['late', /H109V6M45 18H109$/], ['skipped', /M45 21L109 6$/], ['planned', /V6$/]] as const)('draw what is %s in its own way', (state, ends) => {
    expect(sheetPaths(marks({ jobs: [job(state)] }), STRETCH, SCALE)[state]).toMatch(ends)
  })

  it('frame the day to which a job was moved without signal, and no other', () => {
    expect(sheetPaths(marks({ jobs: [job('due', { isKept: true })] }), STRETCH, SCALE).kept).toBe('M67.5 3H86.5v19H67.5Z')
    expect(sheetPaths(marks({ jobs: [job('due'), job('done', { isKept: true })] }), STRETCH, SCALE).kept).toBe('')
  })

  it('leave a done job to the mark of its work, and put no mark where a job is skipped', () => {
    const paths = sheetPaths(marks({ jobs: [job('done'), job('skipped')], works: [{ row: 0, on: '2026-06-04', method: 'foliar', heldTo: null }] }), STRETCH, SCALE)
    expect(paths.foliar).not.toBe('')
    expect(paths.foliarPlanned).toBe('')
  })

  it('set marks of one day side by side, and leave out what lies elsewhere', () => {
    const work = (on: string) => ({ row: 2, on, method: 'drench', heldTo: null }) as const
    const both = sheetPaths(marks({ works: [work('2026-06-01'), work('2026-06-01'), work('2026-07-15')] }), STRETCH, SCALE).drench
    expect(both.match(/M/g)).toHaveLength(2)
    expect([...both.matchAll(/M([\d.]+) /g)].map(([, x]) => Number(x))).toEqual([8.3, 13.7])
  })

  it('run spans on beyond the edge, for the edge to cut', () => {
    const { hold, harvest } = sheetPaths(marks({ works: [{ row: 0, on: '2026-05-28', method: 'foliar', heldTo: '2026-06-02' }], harvests: [{ row: 1, from: '2026-06-20', to: '2026-08-01' }] }), STRETCH, SCALE)
    expect(hold).toBe('M-88 18H44v5H-88Z')
    expect(harvest).toBe('M419 32v-4H1363v4')
  })
})

describe('weeks', () => {
  // ISO 8601: the examples of week dates at the turn of a year that the standard's own rule gives; 1 January 2021 is a Friday of 2020's week 53.
  it.each([['2026-01-01', 1], ['2026-06-16', 25], ['2021-01-01', 53], ['2020-12-31', 53], ['2024-12-30', 1], ['2023-01-01', 52], ['2026-12-31', 53]])('%s lies in week %d', (day, week) => {
    expect(weekOf(day)).toBe(week)
  })
  it('begin on Monday', () => { expect(['2026-06-15', '2026-06-21', '2028-02-29', '1969-12-28'].map(weekdayOf)).toEqual([0, 6, 1, 6]) })
})
