import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { Page } from '../../../shared/contract/common.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { notFound } from '../../errors.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'
import { presentBlock } from './presentBlock.ts'

/** A page of the farm's blocks by code. */
export function listBlocks(services: Services, actor: FarmActor, page: Page): Promise<{ items: BlockAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, (manager) => listByKey(manager, Block, page, actor.farmId, { key: 'code', present: presentBlock }))
}

/** One block. @throws {AppError} not-found. */
export async function getBlock(services: Services, actor: FarmActor, id: string): Promise<BlockAnswer> {
  const block = await services.database.inFarm(actor, (manager) => manager.findOneBy(Block, { farmId: actor.farmId, id }))
  if (!block) throw notFound()
  return presentBlock(block)
}
