import { In, IsNull, type EntityManager } from 'typeorm'
import type { SeasonPlan as PlanAnswer } from '../../../shared/contract/seasonPlan.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import type { SeasonPlan } from '../../entities/SeasonPlan.ts'

/** Plans as the contract shows them, each with its steps in order. */
export async function presentPlans(manager: EntityManager, plans: readonly SeasonPlan[]): Promise<PlanAnswer[]> {
  const [first] = plans
  if (!first) return []
  const steps = await manager.find(PlanStep, {
    where: { farmId: first.farmId, planId: In(plans.map(({ id }) => id)), removedAt: IsNull() }, order: { position: 'ASC' },
  })
  return plans.map((plan) => ({
    id: plan.id,
    name: plan.name,
    note: plan.note,
    steps: steps.filter(({ planId }) => planId === plan.id).map(presentStep),
    ended: plan.endedAt === null ? null : { at: plan.endedAt.toISOString(), reason: plan.endedReason ?? '' },
    revision: plan.revision,
  }))
}

/** One plan as the contract shows it. */
export async function presentPlan(manager: EntityManager, plan: SeasonPlan): Promise<PlanAnswer> {
  const [answer] = await presentPlans(manager, [plan])
  if (!answer) throw new RangeError('A plan was lost while it was shown')
  return answer
}

function presentStep({ id, kind, method, materialId, basis, water, blockIds, everyDays, firstOn, lastOn, earlyDays, lateDays }: PlanStep): PlanAnswer['steps'][number] {
  return { id, kind, method, materialId, basis, water, blockIds, everyDays, firstOn, lastOn, earlyDays, lateDays }
}
