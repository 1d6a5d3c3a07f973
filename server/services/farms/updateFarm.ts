import type { EntityManager } from 'typeorm'
import type { Farm as FarmAnswer } from '../../../shared/contract/farm.ts'
import type { UpdateFarm } from '../../../shared/contract/farmChanges.ts'
import { isZone } from '../../../shared/time/isZone.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Farm } from '../../entities/Farm.ts'
import { FarmEvent } from '../../entities/FarmEvent.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { invalid, notFound, stale, unlikely, type FieldError } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { saidParts } from '../saidParts.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { presentFarm } from './describeFarm.ts'

/**
 * Changes the profile of a farm; what was said before stays in the journal.
 * @throws {AppError} `stale`, `farm.zone`, `farm.season_fixed` once a season is written into signed text,
 *   and unlikely `farm.zone_change` where records stand in the old zone.
 */
export async function updateFarm(services: Services, actor: FarmActor, { revision, acknowledged = [], ...sent }: UpdateFarm): Promise<FarmAnswer> {
  const wanted = saidParts(sent)
  return services.database.inFarm(actor, async (manager) => {
    const farm = await manager.findOne(Farm, { where: { id: actor.farmId }, lock: { mode: 'for_no_key_update' } })
    if (!farm) throw notFound()
    if (farm.revision !== revision) throw stale(await presentFarm(services, manager, farm))
    const faults = await findFaults(manager, farm, wanted)
    if (faults.length > 0) throw invalid(faults)
    const doubts = await findDoubts(manager, farm, wanted)
    const open = doubts.filter(({ code }) => !acknowledged.some((one) => one.code === code))
    if (open.length > 0) throw unlikely(open)
    const changes = { ...wanted, revision: revision + 1 }
    await updateRow(manager, Farm, { id: farm.id }, changes)
    const before = Object.fromEntries(Object.keys(wanted).map((key) => [key, farm[key as keyof typeof wanted]]))
    await appendJournal(services, manager, actor, { action: 'farm.updated', subjectId: farm.id, detail: { before, after: wanted, acknowledged } })
    return presentFarm(services, manager, { ...farm, ...changes })
  })
}

type Wanted = Omit<UpdateFarm, 'revision' | 'acknowledged'>

async function findFaults(manager: EntityManager, farm: Farm, { zone, seasonStart }: Wanted): Promise<FieldError[]> {
  const isFixed = seasonStart !== undefined && seasonStart !== farm.seasonStart && (await hasSeason(manager, farm.id))
  return [
    ...(zone === undefined || isZone(zone) ? [] : [{ path: 'zone', code: 'farm.zone' }]),
    ...(isFixed ? [{ path: 'seasonStart', code: 'farm.season_fixed' }] : []),
  ]
}

/** A season stands in signed text and in farm events, and neither is rewritten. */
async function hasSeason(manager: EntityManager, farmId: string): Promise<boolean> {
  return (await manager.existsBy(RecordVersion, { farmId })) || manager.existsBy(FarmEvent, { farmId })
}

async function findDoubts(manager: EntityManager, farm: Farm, { zone }: Wanted): Promise<FieldError[]> {
  if (zone === undefined || zone === farm.zone || !(await manager.existsBy(ApplicationRecord, { farmId: farm.id }))) return []
  return [{ path: 'zone', code: 'farm.zone_change', params: { before: farm.zone } }]
}
