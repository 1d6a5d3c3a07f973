import type { EntityManager } from 'typeorm'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { invalid } from '../../errors.ts'

/** The block that something new is written for, held against its ending. @throws {AppError} `block.unknown`, `block.ended`. */
export async function openBlock(manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, id: string, path = 'blockId'): Promise<Block> {
  const block = await manager.findOne(Block, { where: { farmId, id }, lock: { mode: 'pessimistic_read' } })
  if (!block) throw invalid([{ path, code: 'block.unknown' }])
  if (block.endedOn !== null) throw invalid([{ path, code: 'block.ended', params: { code: block.code, endedOn: block.endedOn } }])
  return block
}
