import type { Block as BlockAnswer, CreateBlock } from '../../../shared/contract/block.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { digestOf, findRepeat } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { drawingDay } from './drawingDay.ts'
import { insertBlock } from './insertBlock.ts'
import { assertLikely, findBoundaryDoubts, listOutlines, readBoundary } from './judgeBoundary.ts'
import { presentBlock } from './presentBlock.ts'

/**
 * Makes a block from a boundary: impossible ones are refused with every reason, unlikely ones pass when acknowledged.
 * @returns the block, and whether this call made it.
 */
export async function createBlock(services: Services, actor: FarmActor, input: CreateBlock): Promise<{ made: boolean; block: BlockAnswer }> {
  const geometry = readBoundary(input.geometry)
  const creationDigest = digestOf({ ...input, geometry })
  return services.database.inFarm(actor, async (manager) => {
    const repeated = await findRepeat(manager, Block, { farmId: actor.farmId, id: input.id, creationDigest })
    if (repeated) return { made: false, block: await presentBlock(manager, repeated) }
    const drawnOn = drawingDay(services, actor, input.drawnOn)
    assertLikely(findBoundaryDoubts(geometry, await listOutlines(manager, actor.farmId)), input.acknowledged)
    const { made, stored } = await insertBlock(services, manager, actor, {
      ...input, geometry, drawnOn, note: input.note ?? null, creationDigest, fromIds: [], land: null,
    })
    return { made, block: await presentBlock(manager, stored) }
  })
}
