import type { EntityManager } from 'typeorm'
import type { Job, MoveJob, SkipJob, UnskipJob } from '../../../shared/contract/job.ts'
import type { JournalAction } from '../../../shared/journal/journalActions.ts'
import { readJobId, type JobKey } from '../../../shared/rounds/jobKey.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { PlanJob } from '../../entities/PlanJob.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { AppError, invalid, notFound, stale, unlikely, type FieldError } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { holdNumbers } from './holdNumbers.ts'
import { roundsNow } from './listJobs.ts'
import { readJobs } from './readJobs.ts'

type Decision = Pick<PlanJob, 'plannedOn' | 'acknowledged' | 'skippedAt' | 'skippedById' | 'skipReason'>
const UNDECIDED: Decision = { plannedOn: null, acknowledged: [], skippedAt: null, skippedById: null, skipReason: null }

interface Deed {
  revision: number
  /** Whether the job stands as it is wanted already: the same was sent before. */
  stands: (job: Job) => boolean
  /** Refuses what cannot be, or is unlikely and not acknowledged. */
  judge: (job: Job, today: string) => void
  change: Partial<Decision>
  action: JournalAction
  detail: (job: Job) => object
}

/**
 * Moves a job to another day; null puts it back on its target. A day outside its window, or on which picking is planned, is unlikely.
 * @throws {AppError} not-found, `stale`, `job.settled` once it is done or skipped, `job.past_day`, `job.outside_window` until acknowledged.
 */
export function moveJob(services: Services, actor: FarmActor, id: string, { revision, to, acknowledged }: MoveJob): Promise<Job> {
  return decide(services, actor, id, {
    revision,
    stands: (job) => (to === null ? !job.isMoved : job.isMoved && job.plannedOn === to),
    judge: (job, today) => {
      assertOpen(job)
      if (to === null) return
      if (to < today) throw invalid([{ path: 'to', code: 'job.past_day', params: { todayOn: today } }])
      const doubts: FieldError[] = to < job.earliestOn || to > job.latestOn
        ? [{ path: 'to', code: 'job.outside_window', params: { earliestOn: job.earliestOn, latestOn: job.latestOn } }] : []
      if (doubts.some(({ code }) => !acknowledged.some((given) => given.code === code))) throw unlikely(doubts)
    },
    change: { plannedOn: to, acknowledged: to === null ? [] : acknowledged },
    action: 'job.moved',
    detail: ({ plannedOn }) => ({ from: plannedOn, to, acknowledged }),
  })
}

/** Skips a job with the reason; the next counts from its target. @throws {AppError} not-found, `stale`, `job.settled`. */
export function skipJob(services: Services, actor: FarmActor, id: string, { revision, reason }: SkipJob): Promise<Job> {
  return decide(services, actor, id, {
    revision,
    stands: ({ skip }) => skip?.reason === reason && skip.by.id === actor.personId,
    judge: assertOpen,
    change: { skippedAt: services.clock.now(), skippedById: personOf(actor), skipReason: reason },
    action: 'job.skipped',
    detail: ({ targetOn }) => ({ reason, targetOn }),
  })
}

/** Takes a skip back. @throws {AppError} not-found, `stale`, `job.not_skipped`. */
export function unskipJob(services: Services, actor: FarmActor, id: string, { revision }: UnskipJob): Promise<Job> {
  return decide(services, actor, id, {
    revision,
    stands: (job) => job.skip === null && job.revision === revision + 1,
    judge: (job) => { if (job.skip === null) throw new AppError('conflict', 'job.not_skipped', { current: job }) },
    change: { skippedAt: null, skippedById: null, skipReason: null },
    action: 'job.unskipped',
    detail: ({ skip }) => ({ reason: skip?.reason ?? '' }),
  })
}

function decide(services: Services, actor: FarmActor, id: string, deed: Deed): Promise<Job> {
  const key = readJobId(id)
  if (key === null) throw notFound()
  return services.database.inFarm(actor, async (manager) => {
    // One decision on a step at a time: those of one block hang together.
    const step = await manager.findOne(PlanStep, { where: { farmId: actor.farmId, id: key.stepId }, lock: { mode: 'pessimistic_write' } })
    const job = step && (await findJob(services, manager, actor, key, id))
    if (!job) throw notFound()
    if (deed.stands(job)) return job
    if (job.revision !== deed.revision) throw stale(job)
    deed.judge(job, roundsNow(services, actor).today)
    await holdNumbers(manager, roundsNow(services, actor), key.stepId)
    await writeDecision(manager, { farmId: actor.farmId, ...key }, deed.change)
    await appendJournal(services, manager, actor, { action: deed.action, subjectId: key.stepId, detail: { job: id, block: job.blockCode, preparation: job.preparation, ...deed.detail(job) } })
    const after = await findJob(services, manager, actor, key, id)
    if (!after) throw notFound()
    return after
  })
}

async function findJob(services: Services, manager: EntityManager, actor: FarmActor, { stepId, blockId }: JobKey, id: string): Promise<Job | undefined> {
  const { jobs } = await readJobs(manager, roundsNow(services, actor), { stepId, blockId })
  return jobs.find((job) => job.id === id)
}

function assertOpen(job: Job): void {
  if (job.state === 'done' || job.state === 'skipped') throw new AppError('conflict', 'job.settled', { current: job })
}

async function writeDecision(manager: EntityManager, key: JobKey & { farmId: string }, change: Partial<Decision>): Promise<void> {
  const row = await manager.findOneBy(PlanJob, key)
  if (row) await updateRow(manager, PlanJob, key, { ...change, revision: row.revision + 1 })
  else await manager.insert(PlanJob, { ...UNDECIDED, ...key, ...change, revision: 1 })
}
