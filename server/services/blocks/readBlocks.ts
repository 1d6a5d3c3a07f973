import type { z } from 'zod'
import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { blockQuerySchema } from '../../../shared/contract/blockChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { notFound } from '../../errors.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { presentBlock, presentBlocks } from './presentBlock.ts'

/** A page of the farm's blocks by code; those that have ended come along when asked for. */
export async function listBlocks(
  services: Services, actor: FarmActor, { ended, ...page }: z.output<typeof blockQuerySchema>,
): Promise<{ items: BlockAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const found = await listByKey(manager, Block, page, actor.farmId, {
      key: 'code', ...(ended === 'false' && { where: { endedOn: null } }), present: (block) => block,
    })
    return { items: await presentBlocks(manager, found.items), next: found.next }
  })
}

/** One block. @throws {AppError} not-found. */
export async function getBlock(services: Services, actor: FarmActor, id: string): Promise<BlockAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const block = await manager.findOneBy(Block, { farmId: actor.farmId, id })
    if (!block) throw notFound()
    return presentBlock(manager, block)
  })
}
