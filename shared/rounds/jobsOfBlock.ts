import { fromDayNumber, toDayNumber } from '../time/dayNumber.ts'
import { openStateOn } from './openStateOn.ts'

/** When a step comes round: every so many days from the day it was done, between two civil dates. */
export interface RoundRhythm {
  firstOn: string
  lastOn: string
  everyDays: number
  /** Days before and after the target day that it may slip. */
  earlyDays: number
  lateDays: number
}

/** A signed application of the step's preparation and method on the block. */
export interface RoundWork {
  recordId: string
  /** Civil day in the farm's zone. */
  on: string
  /** Of the job that its record was opened from; null where it was written without one. */
  number: number | null
  /** Its record was taken back: it does no job any more, and keeps its place among the others. */
  isWithdrawn?: boolean
}

/** What a person decided about one job. */
export interface JobDecision {
  number: number
  /** The day it was moved to; null where it stands at its target. */
  plannedOn: string | null
  skipped: boolean
}

export type JobState = 'planned' | 'due' | 'late' | 'done' | 'skipped'

export interface RoundJob {
  number: number
  targetOn: string
  earliestOn: string
  latestOn: string
  /** The day it was moved to, else the target. */
  plannedOn: string
  state: JobState
  done: { recordId: string; on: string } | null
}

export interface BlockRound {
  rhythm: RoundRhythm
  works: readonly RoundWork[]
  decisions: readonly JobDecision[]
  /** Civil day in the farm's zone. */
  today: string
  /** Nothing is to be done any more: only what was done or skipped is left. */
  isClosed: boolean
}

/** No plan is longer than a year, so no block has more jobs of one step. */
const MOST_JOBS = 400

/**
 * One block's jobs of one step, in order. The first is for the first day; each next one counts from the day the one before was
 * done, from its target where it was skipped, and from the later of its planned day and today where it is still to be done.
 * A job is done by the record that was opened from it; else by the first work from its first day on that belongs to no job,
 * however late. Work before that day does none. Work that was taken back leaves its job undone and moves no other: which job a work
 * does is settled over all that was ever signed, so that a move or a skip stays on the job it was meant for.
 * @throws {RangeError} if a date is none or the rhythm is not at least a day.
 */
export function jobsOfBlock(round: BlockRound): RoundJob[] {
  const { works } = round
  if (!works.some(({ isWithdrawn }) => isWithdrawn)) return countJobs(round)
  const placed = new Map(countJobs(round).flatMap(({ number, done }) => (done === null ? [] : [[done.recordId, number] as const])))
  return countJobs({ ...round, works: works.filter(({ isWithdrawn }) => !isWithdrawn).map((work) => ({ ...work, number: placed.get(work.recordId) ?? null })) })
}

function countJobs({ rhythm, works, decisions, today, isClosed }: BlockRound): RoundJob[] {
  const { everyDays, earlyDays, lateDays } = rhythm
  if (!(everyDays >= 1)) throw new RangeError(`everyDays must be at least 1, not ${everyDays}`)
  const found = new WorkFinder(works)
  const decided = new Map(decisions.map((decision) => [decision.number, decision]))
  const lastSettled = Math.max(found.lastNumber, ...decisions.filter(({ skipped }) => skipped).map(({ number }) => number))
  const last = toDayNumber(rhythm.lastOn)
  const now = toDayNumber(today)
  const jobs: RoundJob[] = []
  let target = toDayNumber(rhythm.firstOn)
  for (let number = 1; number <= MOST_JOBS && (target <= last || number <= lastSettled); number += 1) {
    const decision = decided.get(number)
    const [earliest, latest] = [target - earlyDays, target + lateDays]
    const isSkipped = decision?.skipped === true
    const done = found.take(number, { from: earliest, isOpen: !isSkipped })
    const planned = decision?.plannedOn === undefined || decision.plannedOn === null ? target : toDayNumber(decision.plannedOn)
    const dates = { earliestOn: fromDayNumber(earliest), latestOn: fromDayNumber(latest), plannedOn: fromDayNumber(planned) }
    const state = done !== null ? 'done' : isSkipped ? 'skipped' : openStateOn(today, dates)
    if (done !== null || isSkipped || !isClosed) {
      jobs.push({
        number, state, done, targetOn: fromDayNumber(target), ...dates,
      })
    }
    if (done !== null) target = toDayNumber(done.on) + everyDays
    else target = (isSkipped || number < lastSettled ? target : Math.max(planned, now)) + everyDays
  }
  return jobs
}

const byDay = (a: RoundWork, b: RoundWork): number => a.on.localeCompare(b.on) || a.recordId.localeCompare(b.recordId)

/** Gives each job its work: the one that names it, else the next that names none. */
class WorkFinder {
  readonly lastNumber: number
  private readonly named = new Map<number, RoundWork>()
  private readonly free: RoundWork[] = []
  private last = Number.NEGATIVE_INFINITY

  constructor(works: readonly RoundWork[]) {
    // A record that stands does its job before one that was taken back.
    const inOrder = [...works].sort((a, b) => Number(a.isWithdrawn ?? false) - Number(b.isWithdrawn ?? false) || byDay(a, b))
    for (const work of inOrder) {
      // Of two records opened from one job, the earlier does it; the other stands on its own.
      if (work.number === null || this.named.has(work.number)) this.free.push(work)
      else this.named.set(work.number, work)
    }
    this.free.sort(byDay)
    this.lastNumber = Math.max(0, ...this.named.keys())
  }

  take(number: number, { from, isOpen }: { from: number; isOpen: boolean }): { recordId: string; on: string } | null {
    const work = this.named.get(number) ?? (isOpen ? this.takeFree(number, from) : undefined)
    if (work === undefined) return null
    this.last = Math.max(this.last, toDayNumber(work.on))
    return { recordId: work.recordId, on: work.on }
  }

  private takeFree(number: number, from: number): RoundWork | undefined {
    const nextNamed = [...this.named].filter(([other]) => other > number).map(([, { on }]) => toDayNumber(on))
    const before = Math.min(...nextNamed)
    const place = this.free.findIndex(({ on }) => { const day = toDayNumber(on); return day >= from && day > this.last && day < before })
    return place === -1 ? undefined : this.free.splice(place, 1)[0]
  }
}
