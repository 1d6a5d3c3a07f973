import type { EntityManager } from 'typeorm'
import type { CreatePlanting, OfBlockQuery, Planting as PlantingAnswer, UpdatePlanting } from '../../../shared/contract/planting.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { MOST_OUTSIDE, outsideShare } from '../../../shared/geo/outsideShare.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { Planting } from '../../entities/Planting.ts'
import { invalid, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { openBlock } from './openBlock.ts'
import { readBoundary } from './judgeBoundary.ts'

/** A page of plantings in the order of their making, of one block where it is named. */
export function listPlantings(services: Services, actor: FarmActor, { blockId, ...page }: OfBlockQuery): Promise<{ items: PlantingAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) =>
    listByKey(manager, Planting, page, actor.farmId, { key: 'id', ...(blockId !== undefined && { where: { blockId } }), present }))
}

/** Writes down what grows on a block. @returns the planting, and whether this call made it. @throws {AppError} `block.unknown`, `block.ended`, invalid-input. */
export async function createPlanting(services: Services, actor: FarmActor, input: CreatePlanting): Promise<{ made: boolean; planting: PlantingAnswer }> {
  const part = readPart(input.part)
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf({ ...input, part })
    const repeated = await findRepeat(manager, Planting, { farmId: actor.farmId, id: input.id, creationDigest })
    if (repeated) return { made: false, planting: present(repeated) }
    const block = await openBlock(manager, actor, input.blockId)
    assertInside(part, block)
    const row: Planting = { ...input, part, farmId: actor.farmId, revision: 1, creationDigest, createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, Planting, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'planting.created', subjectId: input.id, detail: { blockId: block.id, code: block.code, crop: input.crop } })
    return { made, planting: present(stored) }
  })
}

/** Writes a planting anew; what it said before stays in the journal. @throws {AppError} not-found, `stale`, invalid-input. */
export async function updatePlanting(services: Services, actor: FarmActor, id: string, { revision, ...input }: UpdatePlanting): Promise<PlantingAnswer> {
  const part = readPart(input.part)
  return services.database.inFarm(actor, async (manager) => {
    const planting = await lock(manager, actor.farmId, id)
    if (planting.revision !== revision) throw stale(present(planting))
    assertInside(part, await manager.findOneByOrFail(Block, { farmId: actor.farmId, id: planting.blockId }))
    const changes = { ...input, part, revision: revision + 1 }
    await updateRow(manager, Planting, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'planting.updated', subjectId: id, detail: { blockId: planting.blockId, before: present(planting) } })
    return present({ ...planting, ...changes })
  })
}

async function lock(manager: EntityManager, farmId: string, id: string): Promise<Planting> {
  const planting = await manager.findOne(Planting, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!planting) throw notFound()
  return planting
}

const readPart = (sent: CreatePlanting['part']): Boundary | null => (sent === null ? null : readBoundary(sent, 'part'))

function assertInside(part: Boundary | null, block: Block): void {
  if (part === null || outsideShare(part, block.geometry) <= MOST_OUTSIDE) return
  throw invalid([{ path: 'part', code: 'part.outside_block', params: { code: block.code } }])
}

function present({ id, blockId, part, crop, eppo, variety, plantedOn, removedOn, ediblePart, soilContact, harvests, plants, revision }: Planting): PlantingAnswer {
  return { id, blockId, part, crop, eppo, variety, plantedOn, removedOn, ediblePart, soilContact, harvests, plants, revision }
}
