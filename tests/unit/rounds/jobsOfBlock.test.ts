import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { jobIdOf, readJobId } from '../../../shared/rounds/jobKey.ts'
import { jobsOfBlock, type BlockRound, type JobDecision, type RoundWork } from '../../../shared/rounds/jobsOfBlock.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { fromDayNumber, toDayNumber } from '../../../shared/time/dayNumber.ts'

const RHYTHM = { firstOn: '2026-06-01', lastOn: '2026-07-15', everyDays: 14, earlyDays: 2, lateDays: 4 }
const round = (change: Partial<BlockRound> = {}): BlockRound => ({ rhythm: RHYTHM, works: [], decisions: [], today: '2026-05-20', isClosed: false, ...change })
const work = (on: string, number: number | null = null, recordId = `r${on}`): RoundWork => ({ recordId, on, number })
const takenBack = (on: string, number: number | null = null): RoundWork => ({ ...work(on, number, `w${on}`), isWithdrawn: true })
const moved = (number: number, plannedOn: string): JobDecision => ({ number, plannedOn, skipped: false })
const skipped = (number: number): JobDecision => ({ number, plannedOn: null, skipped: true })
/** "1 due 2026-06-01": number, state and the day it was or is to be done. */
const lines = (change: Partial<BlockRound>): string[] => jobsOfBlock(round(change)).map(({ number, state, plannedOn, done }) => `${number} ${state} ${done?.on ?? plannedOn}`)

describe('the jobs of one block', () => {
  it.each<{ name: string; given: Partial<BlockRound>; jobs: string[] }>([
    { name: 'stand every 14 days from the first day while nothing was done', given: {}, jobs: ['1 planned 2026-06-01', '2 planned 2026-06-15', '3 planned 2026-06-29', '4 planned 2026-07-13'] },
    { name: 'are due from the first day they may slip to', given: { today: '2026-05-30' }, jobs: ['1 due 2026-06-01', '2 planned 2026-06-15', '3 planned 2026-06-29', '4 planned 2026-07-13'] },
    { name: 'are due on the last such day still, and those after it count from then', given: { today: '2026-06-05' }, jobs: ['1 due 2026-06-01', '2 planned 2026-06-19', '3 planned 2026-07-03'] },
    { name: 'are late the day after', given: { today: '2026-06-06' }, jobs: ['1 late 2026-06-01', '2 planned 2026-06-20', '3 planned 2026-07-04'] },
    { name: 'count from the day done, later than the target', given: { today: '2026-06-06', works: [work('2026-06-04')] }, jobs: ['1 done 2026-06-04', '2 planned 2026-06-18', '3 planned 2026-07-02'] },
    { name: 'and earlier', given: { today: '2026-06-06', works: [work('2026-05-30')] }, jobs: ['1 done 2026-05-30', '2 planned 2026-06-13', '3 planned 2026-06-27', '4 planned 2026-07-11'] },
    { name: 'are not done by work before their first day', given: { today: '2026-06-01', works: [work('2026-05-29')] }, jobs: ['1 due 2026-06-01', '2 planned 2026-06-15', '3 planned 2026-06-29', '4 planned 2026-07-13'] },
    { name: 'are done late by a record that was made without them', given: { today: '2026-06-20', works: [work('2026-06-12')] }, jobs: ['1 done 2026-06-12', '2 planned 2026-06-26', '3 planned 2026-07-10'] },
    { name: 'take one record each, not two on one day', given: { today: '2026-06-20', works: [work('2026-06-02', null, 'a'), work('2026-06-02', null, 'b')] }, jobs: ['1 done 2026-06-02', '2 due 2026-06-16', '3 planned 2026-07-04'] },
    { name: 'are done by the record opened from them, before their first day too', given: { today: '2026-06-01', works: [work('2026-05-20', 1)] }, jobs: ['1 done 2026-05-20', '2 due 2026-06-03', '3 planned 2026-06-17', '4 planned 2026-07-01', '5 planned 2026-07-15'] },
    { name: 'keep the day they were moved to', given: { decisions: [moved(2, '2026-06-17')] }, jobs: ['1 planned 2026-06-01', '2 planned 2026-06-17', '3 planned 2026-07-01', '4 planned 2026-07-15'] },
    { name: 'keep it when the one before slips', given: { today: '2026-06-06', works: [work('2026-06-05')], decisions: [moved(2, '2026-06-17')] }, jobs: ['1 done 2026-06-05', '2 planned 2026-06-17', '3 planned 2026-07-01', '4 planned 2026-07-15'] },
    { name: 'are not late before the day they were moved to', given: { today: '2026-06-06', decisions: [moved(1, '2026-06-08')] }, jobs: ['1 due 2026-06-08', '2 planned 2026-06-22', '3 planned 2026-07-06'] },
    { name: 'count on from the target of one that was skipped', given: { today: '2026-06-06', decisions: [skipped(1)] }, jobs: ['1 skipped 2026-06-01', '2 planned 2026-06-15', '3 planned 2026-06-29', '4 planned 2026-07-13'] },
    { name: 'that were skipped are not done by work in their days', given: { today: '2026-06-06', works: [work('2026-06-02')], decisions: [skipped(1)] }, jobs: ['1 skipped 2026-06-01', '2 planned 2026-06-15', '3 planned 2026-06-29', '4 planned 2026-07-13'] },
    {
      name: 'stay in their places when an earlier record is withdrawn', given: { today: '2026-06-30', works: [work('2026-06-16', 2)], decisions: [skipped(3)] },
      jobs: ['1 late 2026-06-01', '2 done 2026-06-16', '3 skipped 2026-06-30', '4 planned 2026-07-14'],
    },
    {
      name: 'stay in their places when a record that named none is withdrawn', given: { today: '2026-06-30', works: [takenBack('2026-06-01'), work('2026-06-15')], decisions: [skipped(3)] },
      jobs: ['1 late 2026-06-01', '2 done 2026-06-15', '3 skipped 2026-06-29', '4 planned 2026-07-13'],
    },
    {
      name: 'are done by the record written in the place of the withdrawn one', given: { today: '2026-06-30', works: [takenBack('2026-06-01'), work('2026-06-02', null, 'again'), work('2026-06-15', null, 'b')], decisions: [moved(3, '2026-07-01')] },
      jobs: ['1 done 2026-06-02', '2 done 2026-06-15', '3 due 2026-07-01', '4 planned 2026-07-15'],
    },
    { name: 'are done by the record opened anew from them', given: { today: '2026-06-20', works: [takenBack('2026-06-01', 1), work('2026-06-14', 1, 'again')] }, jobs: ['1 done 2026-06-14', '2 planned 2026-06-28', '3 planned 2026-07-12'] },
    { name: 'are only those done and skipped once nothing is to be done any more', given: { today: '2026-06-20', isClosed: true, works: [work('2026-06-02')], decisions: [skipped(2)] }, jobs: ['1 done 2026-06-02', '2 skipped 2026-06-16'] },
    { name: 'that are late stay so after the last day', given: { today: '2026-08-01', works: ['2026-06-01', '2026-06-15', '2026-06-29'].map((on) => work(on)) }, jobs: ['1 done 2026-06-01', '2 done 2026-06-15', '3 done 2026-06-29', '4 late 2026-07-13'] },
  ])('$name', ({ given, jobs }) => { expect(lines(given)).toEqual(jobs) })

  it('keep their civil days over a leap day and both changes of the clocks', () => {
    const days = (firstOn: string, lastOn: string) => jobsOfBlock(round({ today: '2020-01-01', rhythm: { ...RHYTHM, firstOn, lastOn, everyDays: 10 } })).map(({ targetOn }) => targetOn)
    expect(days('2028-02-20', '2028-03-25')).toEqual(['2028-02-20', '2028-03-01', '2028-03-11', '2028-03-21'])
    expect(days('2026-03-01', '2026-03-31')).toEqual(['2026-03-01', '2026-03-11', '2026-03-21', '2026-03-31'])
    expect(days('2026-10-20', '2026-11-15')).toEqual(['2026-10-20', '2026-10-30', '2026-11-09'])
  })

  it('refuse a rhythm of no days and a day that is none', () => {
    expect(() => jobsOfBlock(round({ rhythm: { ...RHYTHM, everyDays: 0 } }))).toThrow(RangeError)
    expect(() => jobsOfBlock(round({ today: 'soon' }))).toThrow(RangeError)
  })
})

const FIRST = toDayNumber('2026-03-01')
const aDay = fc.integer({ min: -20, max: 200 }).map((days) => fromDayNumber(FIRST + days))
const aRound = fc.record({
  everyDays: fc.integer({ min: 1, max: 40 }), early: fc.integer({ min: 0, max: 10 }), lateDays: fc.integer({ min: 0, max: 20 }), span: fc.integer({ min: 0, max: 150 }), today: aDay,
  works: fc.uniqueArray(fc.record({ on: aDay, number: fc.option(fc.integer({ min: 1, max: 6 })) }), { maxLength: 8, selector: ({ on }) => on }),
  decisions: fc.uniqueArray(fc.record({ number: fc.integer({ min: 1, max: 8 }), plannedOn: fc.option(aDay), skipped: fc.boolean() }), { maxLength: 4, selector: ({ number }) => number }),
}).map(({ everyDays, early, lateDays, span, today, works, decisions }): BlockRound => ({
  rhythm: { firstOn: '2026-03-01', lastOn: fromDayNumber(FIRST + span), everyDays, earlyDays: Math.min(early, everyDays - 1), lateDays },
  works: works.map((each) => ({ ...each, recordId: `r${each.on}` })), decisions, today, isClosed: false,
}))

describe('whatever is done, moved and skipped', () => {
  it('each next job counts from the day the one before was done', () => {
    fc.assert(fc.property(aRound, (given) => {
      const jobs = jobsOfBlock(given)
      for (const [index, job] of jobs.entries()) {
        const next = jobs[index + 1]
        if (next && job.done) expect(next.targetOn).toBe(addDays(job.done.on, given.rhythm.everyDays))
        if (next && job.state === 'skipped') expect(next.targetOn).toBe(addDays(job.targetOn, given.rhythm.everyDays))
      }
    }))
  })

  it('no work does two jobs, the jobs are numbered through, and a window holds its target', () => {
    fc.assert(fc.property(aRound, (given) => {
      const jobs = jobsOfBlock(given)
      const ids = jobs.flatMap(({ done }) => done?.recordId ?? [])
      expect(new Set(ids).size).toBe(ids.length)
      expect(jobs.map(({ number }) => number)).toEqual(jobs.map((_, index) => index + 1))
      for (const { earliestOn, targetOn, latestOn } of jobs) expect([earliestOn, targetOn, latestOn]).toEqual([earliestOn, targetOn, latestOn].sort())
    }))
  })

  it('nothing to be done after the first open job is due: one round at a time', () => {
    fc.assert(fc.property(aRound, (given) => {
      const plain = { ...given, decisions: [], works: given.works.map((each) => ({ ...each, number: null })) }
      const open = jobsOfBlock(plain).filter(({ done }) => done === null)
      for (const job of open.slice(1)) expect(job.state).toBe('planned')
    }))
  })

  it('taking a record back leaves every other record on its job, and so every decision on its own', () => {
    let others = 0
    fc.assert(fc.property(aRound, fc.nat(7), (given, which) => {
      const numbers = given.works.flatMap(({ number }) => number ?? [])
      fc.pre(given.works.length > 0 && new Set(numbers).size === numbers.length)
      const gone = given.works[which % given.works.length]
      const after = jobsOfBlock({ ...given, works: given.works.map((each) => (each === gone ? { ...each, isWithdrawn: true } : each)) })
      for (const { number, done } of jobsOfBlock(given)) {
        if (done === null || done.recordId === gone?.recordId) continue
        others += 1
        expect(after.find((job) => job.done?.recordId === done.recordId)?.number).toBe(number)
      }
      expect(after.flatMap(({ done }) => done?.recordId ?? [])).not.toContain(gone?.recordId)
    }))
    expect(others).toBeGreaterThan(20)
  })

  it('the same facts in another order make the same jobs', () => {
    fc.assert(fc.property(aRound, (given) => {
      expect(jobsOfBlock({ ...given, works: given.works.toReversed(), decisions: given.decisions.toReversed() })).toEqual(jobsOfBlock(given))
    }))
  })
})

describe('the name of a job', () => {
  const key = { stepId: '01990000-0000-7000-8000-000000000001', blockId: '01990000-0000-7000-8000-00000000000a', number: 12 }
  it('is read as it was written', () => { expect(readJobId(jobIdOf(key))).toEqual(key) })
  it.each(['', 'a.b.1', `${key.stepId}.${key.blockId}`, `${key.stepId}.${key.blockId}.0`, `${key.stepId}.${key.blockId}.01`, `${key.stepId}.${key.blockId}.1.1`, `${jobIdOf(key)}\n`])('is not %j', (text) => {
    expect(readJobId(text)).toBeNull()
  })
})
