import type { Bed as BedAnswer, CreateBed, UpdateBed } from '../../../shared/contract/bed.ts'
import type { OfBlockQuery } from '../../../shared/contract/planting.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Bed } from '../../entities/Bed.ts'
import { notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { openBlock } from './openBlock.ts'

/** A page of beds and rows in the order of their making, of one block where it is named. */
export function listBeds(services: Services, actor: FarmActor, { blockId, ...page }: OfBlockQuery): Promise<{ items: BedAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) =>
    listByKey(manager, Bed, page, actor.farmId, { key: 'id', ...(blockId !== undefined && { where: { blockId } }), present }))
}

/** Writes down beds or rows of a block. @returns them, and whether this call made them. @throws {AppError} `block.unknown`, `block.ended`. */
export async function createBed(services: Services, actor: FarmActor, input: CreateBed): Promise<{ made: boolean; bed: BedAnswer }> {
  return services.database.inFarm(actor, async (manager) => {
    const creationDigest = digestOf(input)
    const repeated = await findRepeat(manager, Bed, { farmId: actor.farmId, id: input.id, creationDigest })
    if (repeated) return { made: false, bed: present(repeated) }
    const { code } = await openBlock(manager, actor, input.blockId)
    const row: Bed = { ...input, farmId: actor.farmId, revision: 1, creationDigest, createdAt: services.clock.now() }
    const { made, stored } = await insertOnce(manager, Bed, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await appendJournal(services, manager, actor, { action: 'bed.created', subjectId: input.id, detail: { blockId: input.blockId, code } })
    return { made, bed: present(stored) }
  })
}

/** Writes beds or rows anew; what was said before stays in the journal. @throws {AppError} not-found, `stale`. */
export async function updateBed(services: Services, actor: FarmActor, id: string, { revision, ...input }: UpdateBed): Promise<BedAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const bed = await manager.findOne(Bed, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!bed) throw notFound()
    if (bed.revision !== revision) throw stale(present(bed))
    const changes = { ...input, revision: revision + 1 }
    await updateRow(manager, Bed, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'bed.updated', subjectId: id, detail: { blockId: bed.blockId, before: present(bed) } })
    return present({ ...bed, ...changes })
  })
}

function present({ id, blockId, kind, name, fromNumber, toNumber, count, lengthM, widthM, plants, endedOn, revision }: Bed): BedAnswer {
  return { id, blockId, kind, name, fromNumber, toNumber, count, lengthM, widthM, plants, endedOn, revision }
}
