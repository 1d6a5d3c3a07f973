import type { Farm as FarmAnswer } from '../../../shared/contract/farm.ts'
import { firstCorner } from '../../../shared/geo/boundaryParts.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { IsNull } from 'typeorm'
import type { Services } from '../services.ts'

/** The farm as its people see it; its place is a corner of its first block. */
export async function describeFarm(services: Services, actor: FarmActor): Promise<FarmAnswer> {
  const [first] = await services.database.inFarm(actor, (manager) =>
    manager.find(Block, { select: { geometry: true }, where: { farmId: actor.farmId, endedOn: IsNull() }, order: { createdAt: 'ASC', id: 'ASC' }, take: 1 }),
  )
  return {
    id: actor.farmId,
    name: actor.farmName,
    zone: actor.zone,
    seasonStart: actor.seasonStart,
    currentSeason: seasonOf(civilDateIn(actor.zone, services.clock.now().toISOString()), actor.seasonStart),
    place: first ? (firstCorner(first.geometry) ?? null) : null,
  }
}
