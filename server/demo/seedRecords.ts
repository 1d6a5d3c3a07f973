import { v7 as uuidV7 } from 'uuid'
import { createRecordSchema } from '../../shared/contract/recordChanges.ts'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { toInstant } from '../../shared/time/toInstant.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { createRecord } from '../services/records/createRecord.ts'
import { sealRecord } from '../services/records/sealRecord.ts'
import type { Services } from '../services/services.ts'
import { DEMO_ZONE } from './demoZone.ts'
import { DEMO_WORK, type DemoWork } from './demoWork.ts'
import { seedBegunPhoto, seedLatePhoto, seedStoppedFiles } from './seedFiles.ts'
import type { DemoLots } from './seedInputs.ts'
import { seedLife, type SignedWork } from './seedLife.ts'

const DAY_MS = 86_400_000
const MINUTE_MS = 60_000
const HISTORY_DAYS = 84

interface Ground {
  manager: FarmActor
  applicator: FarmActor
  ruanId: string
  blocks: Map<string, string>
  sprayers: Map<string, string>
  lots: Map<string, DemoLots>
}

interface Task {
  work: DemoWork
  block: string
  startedAt: Date
  /** Hours from the end of the work to the signature. */
  signedAfterH: number
  windMs: string
}

/** Twelve weeks of work up to this morning, one spray begun and not signed, one that went on too strong, one amended, one taken back. */
export async function seedRecords(services: Services, ground: Ground): Promise<void> {
  const tasks = DEMO_WORK.flatMap((work, row) => listTasks(work, row, services.clock.now())).sort((a, b) => a.startedAt.getTime() - b.startedAt.getTime())
  const works: SignedWork[] = []
  for (const task of tasks) works.push({ id: await recordTask(services, ground, task, true), block: task.block, by: task.work.by, signedAt: task.startedAt })
  const last = tasks.findLast(({ block }) => block === 'A5')
  const double = last ? await recordTask(services, ground, { ...last, signedAfterH: HISTORY_DAYS * 24 }, true) : null
  await seedLife(services, ground.manager, { works, double })
  const [apples] = DEMO_WORK
  if (apples) {
    const startedAt = new Date(services.clock.now().getTime() - 25 * MINUTE_MS)
    await recordTask(services, ground, { work: apples, block: 'A2', startedAt, signedAfterH: 0, windMs: '1.6' }, false)
  }
}

function listTasks(work: DemoWork, row: number, now: Date): Task[] {
  const rounds = Math.floor(HISTORY_DAYS / work.everyDays)
  return Array.from({ length: rounds }, (_, round) =>
    work.blocks.map((block, place) => {
      const daysAgo = round * work.everyDays + work.lastDaysAgo
      const startedAt = new Date(morning(now, daysAgo, work.from).getTime() + place * (work.minutes + 9) * MINUTE_MS)
      const late = row === 2 && round === 1 && place === 0
      const strong = work.strongOnce !== undefined && round === 0
      const windMs = strong ? '3.4' : (1.4 + ((round * 7 + place * 3) % 16) / 10).toFixed(1)
      const components = strong ? work.components.map((component) => ({ ...component, basis: { kind: 'ratio' as const, parts: work.strongOnce ?? '' } })) : work.components
      return { work: { ...work, components }, block, startedAt, signedAfterH: late ? 31 : 0.5, windMs }
    }),
  ).flat().filter(({ startedAt }) => startedAt.getTime() + work.minutes * MINUTE_MS < now.getTime())
}

/** A clock time of the farm's civil day so many days ago. */
function morning(now: Date, daysAgo: number, time: string): Date {
  const date = civilDateIn(DEMO_ZONE, new Date(now.getTime() - daysAgo * DAY_MS).toISOString())
  const found = toInstant({ date, time, zone: DEMO_ZONE })
  if (!found.ok) throw new Error(`The demo farm has no ${time} on ${date}`)
  return new Date(found.instant)
}

async function recordTask(services: Services, ground: Ground, task: Task, sign: boolean): Promise<string> {
  const { work, startedAt } = task
  const endedAt = new Date(startedAt.getTime() + work.minutes * MINUTE_MS)
  const enteredAt = sign ? new Date(Math.min(endedAt.getTime() + task.signedAfterH * 3_600_000, services.clock.now().getTime())) : startedAt
  const then = { ...services, clock: fixedClock(enteredAt.toISOString()) }
  const actor = work.by === 'tam' ? ground.applicator : ground.manager
  const input = createRecordSchema.parse({
    id: uuidV7(),
    method: work.method,
    lines: [{ blockId: ground.blocks.get(task.block), startedAt: startedAt.toISOString(), endedAt: sign ? endedAt.toISOString() : null }],
    components: work.components.map(({ material, basis }) => ({ materialId: ground.lots.get(material)?.materialId, lotId: lotAt(ground.lots.get(material), startedAt), basis })),
    water: work.water,
    sprayerId: ground.sprayers.get(work.sprayer),
    weather: {
      wind: { value: task.windMs, unit: 'ms', kind: 'readHere' },
      windFrom: 'NW',
      air: { value: '13.4', unit: 'degC', kind: 'station' },
      humidity: { value: '78', unit: '%', kind: 'station' },
    },
    purpose: work.purpose,
    doneById: work.by === 'ruan' ? ground.ruanId : null,
    deviceAt: enteredAt.toISOString(),
  })
  const { record } = await createRecord(then, actor, input)
  if (!sign) {
    await seedBegunPhoto(then, actor, record.id)
    return record.id
  }
  const acknowledged = [{ code: 'record.stop', reason: 'The soap was measured twice into one load. Mirel Achter told the same day; the leaves were rinsed.' }]
  const stopped = record.checks.some(({ verdict }) => verdict === 'stop')
  if (stopped) await seedStoppedFiles(then, actor, record.id)
  await services.database.inFarm(actor, (manager) => sealRecord(then, manager, actor, record.id, { acknowledged: stopped ? acknowledged : [] }))
  if (!stopped) return record.id
  const dayLater = fixedClock(new Date(Math.min(enteredAt.getTime() + DAY_MS, services.clock.now().getTime())).toISOString())
  await seedLatePhoto({ ...services, clock: dayLater }, actor, record.id)
  return record.id
}

/** The lot in use on a day: the newest that had been received. */
function lotAt(lots: DemoLots | undefined, day: Date): string | null {
  const inUse = (lots?.lots ?? []).filter(({ receivedAt }) => receivedAt <= day).sort((a, b) => b.receivedAt.getTime() - a.receivedAt.getTime())
  return inUse[0]?.id ?? lots?.lots.at(-1)?.id ?? null
}
