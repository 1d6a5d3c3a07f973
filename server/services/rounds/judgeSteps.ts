import { In, type EntityManager } from 'typeorm'
import type { PlanStep as StepContent } from '../../../shared/contract/seasonPlan.ts'
import { toDayNumber } from '../../../shared/time/dayNumber.ts'
import { Block } from '../../entities/Block.ts'
import { Material } from '../../entities/Material.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { invalid, type FieldError } from '../../errors.ts'
import { findBasisFaults } from '../records/findBasisFaults.ts'

/** More jobs than this nobody does in a season, and no sheet shows them. */
const MOST_JOBS = 25_000

interface Judged { farmId: string; planId: string; steps: readonly StepContent[]; before: readonly PlanStep[] }

/**
 * Judges the steps of a plan against the farm. Blocks that stood in a step before they ended may stay in it.
 * @throws {AppError} `block.unknown`, `block.ended`, `material.unknown`, `water.not_for_solid`, `plan.too_many_jobs`, `idempotency.mismatch`, or a basis that does not fit.
 */
export async function judgeSteps(manager: EntityManager, { farmId, planId, steps, before }: Judged): Promise<void> {
  const blocks = await manager.find(Block, { select: { id: true, code: true, endedOn: true }, where: { farmId, id: In(steps.flatMap(({ blockIds }) => blockIds)) } })
  const materials = await manager.findBy(Material, { farmId, id: In(steps.map(({ materialId }) => materialId)) })
  const taken = await manager.find(PlanStep, { select: { id: true, planId: true }, where: { farmId, id: In(steps.map(({ id }) => id)) } })
  const faults = steps.flatMap((step, index): FieldError[] => {
    const path = `steps.${index}`
    const stood = new Set(before.find(({ id }) => id === step.id)?.blockIds)
    const material = materials.find(({ id }) => id === step.materialId)
    return [
      ...(taken.some(({ id, planId: owner }) => id === step.id && owner !== planId) ? [{ path: `${path}.id`, code: 'idempotency.mismatch' }] : []),
      ...step.blockIds.flatMap((id, place): FieldError[] => {
        const block = blocks.find((candidate) => candidate.id === id)
        if (!block) return [{ path: `${path}.blockIds.${place}`, code: 'block.unknown' }]
        if (block.endedOn === null || stood.has(id)) return []
        return [{ path: `${path}.blockIds.${place}`, code: 'block.ended', params: { code: block.code, endedOn: block.endedOn } }]
      }),
      ...(material ? findBasisFaults(step.basis, material, `${path}.basis`) : [{ path: `${path}.materialId`, code: 'material.unknown' }]),
      ...(step.method === 'solid' && step.water !== null ? [{ path: `${path}.water`, code: 'water.not_for_solid' }] : []),
    ]
  })
  if (countJobs(steps) > MOST_JOBS) faults.push({ path: 'steps', code: 'plan.too_many_jobs', params: { most: MOST_JOBS } })
  if (faults.length > 0) throw invalid(faults)
}

/** Jobs at most: every round done on its target day. */
function countJobs(steps: readonly StepContent[]): number {
  const rounds = ({ firstOn, lastOn, everyDays }: StepContent): number => Math.floor((toDayNumber(lastOn) - toDayNumber(firstOn)) / everyDays) + 1
  return steps.reduce((sum, step) => sum + rounds(step) * step.blockIds.length, 0)
}
