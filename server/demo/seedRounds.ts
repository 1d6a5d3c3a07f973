import { v7 as uuidV7 } from 'uuid'
import { createPlanSchema, type CreatePlan } from '../../shared/contract/seasonPlan.ts'
import { addDays } from '../../shared/time/calendar.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { moveJob, skipJob } from '../services/rounds/decideJobs.ts'
import { createPlan } from '../services/rounds/seasonPlans.ts'
import type { Services } from '../services/services.ts'
import { DEMO_ZONE } from './demoZone.ts'
import type { DemoLots } from './seedInputs.ts'

const DAY_MS = 86_400_000
const PLANNED_DAYS_AGO = 40

interface Ground { manager: FarmActor; blocks: Map<string, string>; lots: Map<string, DemoLots> }
interface Step { material: string; method: 'foliar' | 'drench'; parts: string; rate: string; blocks: string[]; everyDays: number; firstDaysAgo: number; lastInDays: number; early: number; late: number }

const STEPS: Step[] = [
  { material: 'nettle', method: 'foliar', parts: '40', rate: '425', blocks: ['A1', 'A2', 'A3', 'A4', 'A5', 'P1', 'P2', 'P3'], everyDays: 13, firstDaysAgo: 27, lastInDays: 70, early: 2, late: 4 },
  { material: 'leafMould', method: 'drench', parts: '20', rate: '600', blocks: ['T1', 'T2', 'V1', 'V2', 'V3', 'V4', 'V5'], everyDays: 16, firstDaysAgo: 2, lastInDays: 75, early: 2, late: 3 },
  { material: 'comfrey', method: 'drench', parts: '15', rate: '500', blocks: ['H1', 'S1', 'S2', 'S3'], everyDays: 16, firstDaysAgo: 7, lastInDays: 60, early: 2, late: 4 },
]

/** One season plan in progress: some rounds done, some due, some late, one moved, one skipped. */
export async function seedRounds(services: Services, { manager, blocks, lots }: Ground): Promise<void> {
  const today = civilDateIn(DEMO_ZONE, services.clock.now().toISOString())
  const before = fixedClock(new Date(services.clock.now().getTime() - PLANNED_DAYS_AGO * DAY_MS).toISOString())
  const blockOf = (code: string): string => blocks.get(code) ?? ''
  const plan: CreatePlan = createPlanSchema.parse({
    id: uuidV7(), name: 'Nettle, leaf mould and comfrey', note: 'Apples and pears first; the field vegetables when the leaf mould is ready.',
    steps: STEPS.map((step) => ({
      id: uuidV7(), method: step.method, materialId: lots.get(step.material)?.materialId, basis: { kind: 'ratio', parts: step.parts },
      water: { sizedFrom: 'sprayRate', value: step.rate, unit: 'L/ha', source: 'Rain tank 2' }, blockIds: step.blocks.map(blockOf),
      everyDays: step.everyDays, firstOn: addDays(today, -step.firstDaysAgo), lastOn: addDays(today, step.lastInDays), earlyDays: step.early, lateDays: step.late,
    })),
  })
  await createPlan({ ...services, clock: before }, manager, plan)
  const job = (step: number, code: string): string => `${plan.steps[step]?.id ?? ''}.${blockOf(code)}.1`
  await moveJob(services, manager, job(1, 'V2'), { revision: 0, to: addDays(today, 1), acknowledged: [] })
  await skipJob(services, manager, job(2, 'S3'), { revision: 0, reason: 'Picking since last week: no drench over the fruit.' })
}
