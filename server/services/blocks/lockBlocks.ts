import { In, type EntityManager } from 'typeorm'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { presentBlock } from './presentBlock.ts'

/** Blocks held until the transaction ends, in the order of their ids, so that two deeds never wait for each other crosswise. */
export function lockBlocks(manager: EntityManager, farmId: string, ids: readonly string[]): Promise<Block[]> {
  return manager.find(Block, { where: { farmId, id: In([...new Set(ids)]) }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } })
}

/** One block held. @throws {AppError} not-found. */
export async function lockBlock(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, id: string): Promise<Block> {
  const [block] = await lockBlocks(manager, farmId, [id])
  if (!block) throw notFound()
  return block
}

/** @throws {AppError} `stale` with the block as it is now, or `block.already_ended`. */
export async function assertCurrent(manager: EntityManager, block: Block, revision: number): Promise<void> {
  if (block.revision !== revision) throw stale(await presentBlock(manager, block))
  if (block.endedOn !== null) throw new AppError('conflict', 'block.already_ended', { current: await presentBlock(manager, block) })
}
