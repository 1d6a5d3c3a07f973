import { In, IsNull, type EntityManager } from 'typeorm'
import type { Job } from '../../../shared/contract/job.ts'
import { jobIdOf } from '../../../shared/rounds/jobKey.ts'
import { jobsOfBlock, type RoundJob } from '../../../shared/rounds/jobsOfBlock.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { Block } from '../../entities/Block.ts'
import { Material } from '../../entities/Material.ts'
import { Person } from '../../entities/Person.ts'
import { PlanJob } from '../../entities/PlanJob.ts'
import { PlanStep } from '../../entities/PlanStep.ts'
import { SeasonPlan } from '../../entities/SeasonPlan.ts'
import { readWorks, type SignedWork } from './readWorks.ts'

export interface RoundsAt {
  farmId: string
  zone: string
  /** Civil day in the farm's zone. */
  today: string
}

interface Link { record_id: string; step_id: string; block_id: string; number: number; state: string; sort_at: Date }

interface StepGround {
  block: Pick<Block, 'id' | 'code' | 'endedOn'>
  step: PlanStep
  plan: SeasonPlan
  preparation: string
  works: readonly SignedWork[]
  decisions: readonly PlanJob[]
  links: readonly Link[]
  people: ReadonlyMap<string, string>
}

/** Every job of the farm's plans as it stands today, or of one step and block; in the order of plans, steps and blocks. */
export async function readJobs(manager: EntityManager, at: RoundsAt, only: { stepId?: string; blockId?: string } = {}): Promise<{ jobs: Job[]; works: SignedWork[] }> {
  const { farmId, today } = at
  const steps = await manager.find(PlanStep, {
    where: { farmId, removedAt: IsNull(), ...(only.stepId !== undefined && { id: only.stepId }) }, order: { planId: 'ASC', position: 'ASC' },
  })
  if (steps.length === 0) return { jobs: [], works: [] }
  const stepIds = In(steps.map(({ id }) => id))
  const plans = await manager.findBy(SeasonPlan, { farmId, id: In(steps.map(({ planId }) => planId)) })
  const materials = await manager.find(Material, { select: { id: true, name: true }, where: { farmId, id: In(steps.map(({ materialId }) => materialId)) } })
  const blocks = await manager.find(Block, {
    select: { id: true, code: true, endedOn: true }, where: { farmId, id: In(only.blockId === undefined ? steps.flatMap(({ blockIds }) => blockIds) : [only.blockId]) }, order: { code: 'ASC', id: 'ASC' },
  })
  const decisions = await manager.findBy(PlanJob, { farmId, stepId: stepIds })
  const skippers = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(decisions.flatMap(({ skippedById }) => skippedById ?? [])) } })
  const links: Link[] = await manager.query(
    `SELECT l.record_id, l.step_id, l.block_id, l.number, r.state, r.sort_at FROM plan_job_records l
     JOIN application_records r ON r.farm_id = l.farm_id AND r.id = l.record_id WHERE l.farm_id = $1 AND l.step_id = ANY ($2)`,
    [farmId, steps.map(({ id }) => id)],
  )
  // A record that was opened from a job does it on whatever day.
  const days = [...steps.map(({ firstOn, earlyDays }) => addDays(firstOn, -earlyDays)), ...links.map(({ sort_at }) => civilDateIn(at.zone, sort_at.toISOString()))]
  const firstDay = days.sort()[0] ?? today
  const works = await readWorks(manager, at, { from: firstDay, to: today, withWithdrawn: true })
  const people = new Map(skippers.map(({ id, name }) => [id, name]))
  const jobs = steps.flatMap((step) => {
    const plan = plans.find(({ id }) => id === step.planId)
    const preparation = materials.find(({ id }) => id === step.materialId)?.name ?? ''
    if (!plan) return []
    return blocks.filter(({ id }) => step.blockIds.includes(id)).flatMap((block) => jobsOn({
      block, step, plan, preparation, people,
      works: works.filter((work) => work.blockId === block.id && work.method === step.method && work.materialIds.includes(step.materialId)),
      decisions: decisions.filter(({ stepId, blockId }) => stepId === step.id && blockId === block.id),
      links: links.filter(({ step_id, block_id }) => step_id === step.id && block_id === block.id),
    }, today))
  })
  return { jobs, works }
}

function jobsOn(ground: StepGround, today: string): Job[] {
  const { step, plan, block, works, decisions, links } = ground
  return jobsOfBlock({
    rhythm: step,
    works: works.map(({ recordId, on, isWithdrawn }) => ({ recordId, on, isWithdrawn, number: links.find(({ record_id }) => record_id === recordId)?.number ?? null })),
    decisions: decisions.map(({ number, plannedOn, skippedAt }) => ({ number, plannedOn, skipped: skippedAt !== null })),
    today,
    isClosed: plan.endedAt !== null || block.endedOn !== null,
  }).map((job) => present(job, ground))
}

function present(job: RoundJob, { step, block, preparation, works, decisions, links, people }: StepGround): Job {
  const { number, state, done, targetOn, earliestOn, latestOn, plannedOn } = job
  const decision = decisions.find((candidate) => candidate.number === number)
  const isSkipped = state === 'skipped' && decision?.skippedAt instanceof Date
  return {
    id: jobIdOf({ stepId: step.id, blockId: block.id, number }),
    planId: step.planId, stepId: step.id, blockId: block.id, number, method: step.method, materialId: step.materialId, preparation, blockCode: block.code,
    targetOn, earliestOn, latestOn, plannedOn, isMoved: decision?.plannedOn != null, state,
    done: done && { ...done, number: works.find(({ recordId }) => recordId === done.recordId)?.number ?? '' },
    skip: isSkipped ? {
      reason: decision.skipReason ?? '', by: { id: decision.skippedById ?? '', name: people.get(decision.skippedById ?? '') ?? '' }, at: decision.skippedAt?.toISOString() ?? '',
    } : null,
    openRecordId: links.find((link) => link.number === number && (link.state === 'draft' || link.state === 'started'))?.record_id ?? null,
    revision: decision?.revision ?? 0,
  }
}
