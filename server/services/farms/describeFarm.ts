import type { Farm as FarmAnswer } from '../../../shared/contract/farm.ts'
import { firstCorner } from '../../../shared/geo/boundaryParts.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { Farm } from '../../entities/Farm.ts'
import { IsNull, type EntityManager } from 'typeorm'
import type { Services } from '../services.ts'
import { readCertificates } from './certificates.ts'

/** The farm as its people see it; its place is a corner of its first block, or where somebody set the map to open. */
export async function describeFarm(services: Services, actor: FarmActor): Promise<FarmAnswer> {
  return services.database.inFarm(actor, async (manager) => presentFarm(services, manager, await manager.findOneByOrFail(Farm, { id: actor.farmId })))
}

/** A farm's row as it is answered. */
export async function presentFarm({ clock }: Pick<Services, 'clock'>, manager: EntityManager, farm: Farm): Promise<FarmAnswer> {
  const { id, name, zone, seasonStart, units, contact, ruleSets, calibrationDays, home, practice, revision } = farm
  const [first] = await manager.find(Block, { select: { geometry: true }, where: { farmId: id, endedOn: IsNull() }, order: { createdAt: 'ASC', id: 'ASC' }, take: 1 })
  return {
    id, name, zone, seasonStart, units, contact, ruleSets, calibrationDays, home, practice, revision,
    certificates: await readCertificates(manager, { farmId: id }),
    currentSeason: seasonOf(civilDateIn(zone, clock.now().toISOString()), seasonStart),
    place: first ? (firstCorner(first.geometry) ?? null) : home,
  }
}
