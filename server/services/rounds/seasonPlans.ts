import { In, IsNull, type EntityManager } from 'typeorm'
import type { CreatePlan, EndPlan, PlanStep as StepContent, SeasonPlan as PlanAnswer, UpdatePlan } from '../../../shared/contract/seasonPlan.ts'
import type { Page } from '../../../shared/contract/common.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { JournalAction } from '../../../shared/journal/journalActions.ts'
import type { FarmActor } from '../../database/actor.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { SeasonPlan } from '../../entities/SeasonPlan.ts'
import { notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { judgeSteps } from './judgeSteps.ts'
import { presentPlan, presentPlans } from './presentPlan.ts'

/** A page of season plans in the order of their making, those that ended too. */
export function listPlans(services: Services, actor: FarmActor, page: Page): Promise<{ items: PlanAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const { items, next } = await listByKey(manager, SeasonPlan, page, actor.farmId, { key: 'id', present: (plan) => plan })
    return { items: await presentPlans(manager, items), next }
  })
}

/** One season plan. @throws {AppError} not-found. */
export function getPlan(services: Services, actor: FarmActor, id: string): Promise<PlanAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const plan = await manager.findOneBy(SeasonPlan, { farmId: actor.farmId, id })
    if (!plan) throw notFound()
    return presentPlan(manager, plan)
  })
}

/** Writes a season plan down. @returns the plan, and whether this call made it. @throws {AppError} see `judgeSteps`. */
export async function createPlan(services: Services, actor: FarmActor, input: CreatePlan): Promise<{ made: boolean; plan: PlanAnswer }> {
  const { farmId } = actor
  const { id, name, note } = input
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf(input)
    const repeated = await findRepeat(manager, SeasonPlan, { farmId, id, creationDigest })
    if (repeated) return { made: false, plan: await presentPlan(manager, repeated) }
    await judgeSteps(manager, { farmId, planId: id, steps: input.steps, before: [] })
    const row: SeasonPlan = { farmId, id, name, note, endedAt: null, endedReason: null, revision: 1, creationDigest, createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, SeasonPlan, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) {
      await manager.insert(PlanStep, input.steps.map((step, position) => stepRow(farmId, id, step, position)))
      await appendJournal(services, manager, actor, { action: 'plan.created', subjectId: id, detail: { name } })
    }
    return { made, plan: await presentPlan(manager, stored) }
  })
}

/**
 * Writes a plan anew; what it said before stays in the journal. Sent again as it stands, it answers as it did.
 * @throws {AppError} not-found, `stale`, see `judgeSteps`.
 */
export function updatePlan(services: Services, actor: FarmActor, id: string, { revision, ...input }: UpdatePlan): Promise<PlanAnswer> {
  const { farmId } = actor
  return services.database.inFarm(actor, async (manager) => {
    const plan = await lockPlan(manager, actor, id)
    const before = await presentPlan(manager, plan)
    const { name, note, steps } = before
    if (plan.revision === revision + 1 && canonicalText({ name, note, steps }) === canonicalText(input)) return before
    if (plan.revision !== revision) throw stale(before)
    const rows = await manager.findBy(PlanStep, { farmId, planId: id })
    await judgeSteps(manager, { farmId, planId: id, steps: input.steps, before: rows })
    const kept = input.steps.map((step) => step.id)
    const left = rows.filter((row) => row.removedAt === null && !kept.includes(row.id)).map((row) => row.id)
    if (left.length > 0) await manager.update(PlanStep, { farmId, id: In(left), removedAt: IsNull() }, { removedAt: services.clock.now() })
    for (const [position, step] of input.steps.entries()) await writeStep(manager, stepRow(farmId, id, step, position), rows)
    const changes = { name: input.name, note: input.note, revision: revision + 1 }
    await updateRow(manager, SeasonPlan, { farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'plan.updated', subjectId: id, detail: { before: { name, note, steps } } })
    return presentPlan(manager, { ...plan, ...changes })
  })
}

/** Ends a plan with the reason: nothing of it is due any more, what was done stays. @throws {AppError} not-found, `stale`. */
export function endPlan(services: Services, actor: FarmActor, id: string, { revision, reason }: EndPlan): Promise<PlanAnswer> {
  return setEnded(services, actor, id, { revision, ended: { endedAt: services.clock.now(), endedReason: reason }, action: 'plan.ended', detail: { reason } })
}

/** Takes the end of a plan back. @throws {AppError} not-found, `stale`. */
export function reopenPlan(services: Services, actor: FarmActor, id: string, { revision }: { revision: number }): Promise<PlanAnswer> {
  return setEnded(services, actor, id, { revision, ended: { endedAt: null, endedReason: null }, action: 'plan.reopened', detail: {} })
}

interface Ending { revision: number; ended: Pick<SeasonPlan, 'endedAt' | 'endedReason'>; action: JournalAction; detail: object }

function setEnded(services: Services, actor: FarmActor, id: string, { revision, ended, action, detail }: Ending): Promise<PlanAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const plan = await lockPlan(manager, actor, id)
    // Sent again, or ended by somebody else for the same reason: it stands as it was wanted.
    if (plan.endedReason === ended.endedReason) return presentPlan(manager, plan)
    if (plan.revision !== revision) throw stale(await presentPlan(manager, plan))
    const changes = { ...ended, revision: revision + 1 }
    await updateRow(manager, SeasonPlan, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action, subjectId: id, detail })
    return presentPlan(manager, { ...plan, ...changes })
  })
}

async function lockPlan(manager: EntityManager, { farmId }: FarmActor, id: string): Promise<SeasonPlan> {
  const plan = await manager.findOne(SeasonPlan, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!plan) throw notFound()
  return plan
}

async function writeStep(manager: EntityManager, row: PlanStep, rows: readonly PlanStep[]): Promise<void> {
  if (rows.some(({ id }) => id === row.id)) await updateRow(manager, PlanStep, { farmId: row.farmId, id: row.id }, row)
  else await manager.insert(PlanStep, row)
}

function stepRow(farmId: string, planId: string, { blockIds, ...step }: StepContent, position: number): PlanStep {
  return { ...step, farmId, planId, position, blockIds: [...new Set(blockIds)], removedAt: null }
}
