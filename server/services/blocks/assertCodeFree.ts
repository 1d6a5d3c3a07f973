import type { EntityManager } from 'typeorm'
import { Block } from '../../entities/Block.ts'
import { AppError } from '../../errors.ts'

/** @param except ids of blocks that may have it. @throws {AppError} conflict, `code.taken`, if another block that has not ended bears the code. */
export async function assertCodeFree(manager: EntityManager, farmId: string, code: string, except: readonly string[], path = 'code'): Promise<void> {
  const taken = await manager.createQueryBuilder(Block, 'block')
    .where('block.farmId = :farmId AND block.endedOn IS NULL AND lower(block.code) = lower(:code)', { farmId, code })
    .andWhere('block.id <> ALL (:except)', { except: [...except] })
    .getExists()
  if (taken) throw new AppError('conflict', 'conflict', { errors: [{ path, code: 'code.taken', params: { code } }] })
}
