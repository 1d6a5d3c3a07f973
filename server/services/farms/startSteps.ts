import type { EntityManager } from 'typeorm'
import { START_STEPS, type Start, type StartStep, type UpdateStart } from '../../../shared/contract/start.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { Farm } from '../../entities/Farm.ts'
import { Material } from '../../entities/Material.ts'
import { Person } from '../../entities/Person.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'

/** How far a farm's first hour is, read off the farm itself. */
export function readStart(services: Services, actor: FarmActor): Promise<Start> {
  return services.database.inFarm(actor, async (manager) => presentStart(manager, await manager.findOneByOrFail(Farm, { id: actor.farmId })))
}

/** Passes steps over, takes that back, or puts the whole away. */
export function updateStart(services: Services, actor: FarmActor, { skipped, away }: UpdateStart): Promise<Start> {
  return services.database.inFarm(actor, async (manager) => {
    const farm = await manager.findOne(Farm, { where: { id: actor.farmId }, lock: { mode: 'for_no_key_update' } })
    if (!farm) throw notFound()
    // In their own order and once each, so that the same wish is the same row.
    const changes = { startSkipped: START_STEPS.filter((step) => (skipped ?? farm.startSkipped).includes(step)), startAway: away ?? farm.startAway }
    await updateRow(manager, Farm, { id: farm.id }, changes)
    await appendJournal(services, manager, actor, { action: 'start.updated', subjectId: farm.id, detail: changes })
    return presentStart(manager, { ...farm, ...changes })
  })
}

async function presentStart(manager: EntityManager, farm: Farm): Promise<Start> {
  const { id: farmId, startSkipped, startAway } = farm
  const hasBlock = await manager.existsBy(Block, { farmId })
  const done: Record<StartStep, boolean> = {
    place: hasBlock || farm.home !== null,
    profile: await wasSaid(manager, farmId),
    block: hasBlock,
    material: await manager.existsBy(Material, { farmId }),
    record: await manager.existsBy(RecordVersion, { farmId }),
    person: (await manager.countBy(Person, { farmId })) > 1,
  }
  return {
    steps: START_STEPS.map((step) => ({ step, state: done[step] ? 'done' : startSkipped.includes(step) ? 'skipped' : 'open' })),
    away: startAway,
  }
}

/** Season and units have a value from the first; whether somebody looked and saved them stands in the journal. */
async function wasSaid(manager: EntityManager, farmId: string): Promise<boolean> {
  const [row]: [{ said: boolean }] = await manager.query(
    "SELECT EXISTS (SELECT 1 FROM journal WHERE farm_id = $1 AND action = 'farm.updated' AND detail->'after' ? 'units') AS said", [farmId],
  )
  return row.said
}
