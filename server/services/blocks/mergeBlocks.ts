import type { EntityManager } from 'typeorm'
import type { BlocksChanged, MergeBlocks } from '../../../shared/contract/blockChanges.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { invalid } from '../../errors.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { assertCodeFree } from './assertCodeFree.ts'
import { drawingDay } from './drawingDay.ts'
import { endBlocks } from './endBlocks.ts'
import { insertBlock } from './insertBlock.ts'
import { assertLikely } from './judgeBoundary.ts'
import { assertCurrent, lockBlocks } from './lockBlocks.ts'
import { presentBlocks } from './presentBlock.ts'

/**
 * Puts blocks together, all or nothing: they end, one begins. Crop and land go along where all of them say the same. Pieces that
 * touch nowhere make one block when acknowledged (`geometry.apart`). A repeat answers with what is there.
 * @throws {AppError} `block.unknown`, `stale`, `block.already_ended`, `code.taken`, invalid-input, or `unlikely`.
 */
export async function mergeBlocks(services: Services, actor: FarmActor, input: MergeBlocks): Promise<BlocksChanged> {
  const ids = input.blocks.map(({ id }) => id)
  if (new Set(ids).size < ids.length) throw invalid([{ path: 'blocks', code: 'merge.twice' }])
  const creationDigest = digestOf({ ...input.block, from: ids })
  return services.database.inFarm(actor, async (manager) => {
    const blocks = await openBlocks(manager, actor, ids)
    const repeated = await manager.findOneBy(Block, { farmId: actor.farmId, id: input.block.id, creationDigest })
    if (repeated) return present(manager, blocks, repeated)
    for (const [index, block] of blocks.entries()) await assertCurrent(manager, block, input.blocks[index]?.revision ?? 0)
    const geometry = unite(blocks, input)
    await assertCodeFree(manager, actor.farmId, input.block.code, ids, 'block.code')
    const ended = await endBlocks(services, manager, actor, blocks, { by: 'merge', intoIds: [input.block.id] })
    const { made, stored } = await insertBlock(services, manager, actor, {
      id: input.block.id, code: input.block.code, name: input.block.name, crop: input.block.crop ?? shared(blocks, 'crop'), geometry,
      drawnOn: drawingDay(services, actor, input.drawnOn), note: null, acknowledged: input.acknowledged, creationDigest, fromIds: ids, land: shared(blocks, 'land'),
    })
    if (!made) throw invalid([{ path: 'block.id', code: 'idempotency.mismatch' }])
    return present(manager, ended, stored)
  })
}

/** The blocks in the order they were named, held. @throws {AppError} `block.unknown`. */
async function openBlocks(manager: EntityManager, { farmId }: FarmActor, ids: readonly string[]): Promise<Block[]> {
  const found = await lockBlocks(manager, farmId, ids)
  const unknown = ids.flatMap((id, index) => (found.some((block) => block.id === id) ? [] : [{ path: `blocks.${index}.id`, code: 'block.unknown' }]))
  if (unknown.length > 0) throw invalid(unknown)
  return found.sort((a, b) => ids.indexOf(a.id) - ids.indexOf(b.id))
}

function unite(blocks: readonly Block[], { acknowledged }: MergeBlocks): Boundary {
  const { geometry, findings, isApart } = uniteBoundaries(blocks.map((block) => block.geometry))
  if (!geometry || findings.length > 0) throw invalid(findings.map(({ code, params }) => ({ path: 'blocks', code, params })))
  if (isApart) assertLikely([{ path: 'blocks', code: 'geometry.apart' }], acknowledged)
  return geometry
}

/** What all of the blocks say alike; null where they differ. */
function shared<Name extends 'crop' | 'land'>(blocks: readonly Block[], name: Name): Block[Name] | null {
  const [first] = blocks
  return first && blocks.every((block) => canonicalText(block[name]) === canonicalText(first[name])) ? first[name] : null
}

async function present(manager: EntityManager, ended: Block[], open: Block): Promise<BlocksChanged> {
  return { ended: await presentBlocks(manager, ended), open: await presentBlocks(manager, [open]) }
}
