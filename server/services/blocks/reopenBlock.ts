import { In, type EntityManager } from 'typeorm'
import type { BlocksChanged } from '../../../shared/contract/blockChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Bed } from '../../entities/Bed.ts'
import { Block } from '../../entities/Block.ts'
import { FarmEventBlock } from '../../entities/FarmEventBlock.ts'
import { Planting } from '../../entities/Planting.ts'
import { RecordLine } from '../../entities/RecordLine.ts'
import { AppError, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { assertCodeFree } from './assertCodeFree.ts'
import { endBlocks } from './endBlocks.ts'
import { lockBlock, lockBlocks } from './lockBlocks.ts'
import { presentBlock, presentBlocks } from './presentBlock.ts'

/**
 * Undoes the cut or the join that ended a block: every block that ended with it stands again, what came of it ends.
 * @throws {AppError} not-found, `stale`, `block.not_ended`, `code.taken`, or `block.reopen_used` where what came of it has changed or
 *   has records, plantings, beds or events of its own.
 */
export async function reopenBlock(services: Services, actor: FarmActor, id: string, { revision }: { revision: number }): Promise<BlocksChanged> {
  const { farmId } = actor
  return services.database.inFarm(actor, async (manager) => {
    const block = await lockBlock(manager, actor, id)
    if (block.revision !== revision) throw stale(await presentBlock(manager, block))
    if (block.endedBy !== 'split' && block.endedBy !== 'merge') throw new AppError('conflict', 'block.not_ended', { current: await presentBlock(manager, block) })
    const made = await lockBlocks(manager, farmId, block.intoIds)
    await assertUntouched(manager, farmId, made)
    const gone = await lockBlocks(manager, farmId, made[0]?.fromIds ?? [])
    for (const { code } of gone) await assertCodeFree(manager, farmId, code, made.map((each) => each.id))
    const ended = await endBlocks(services, manager, actor, made, { by: 'undone', intoIds: [] })
    await manager.createQueryBuilder().update(Block).set({ endedOn: null, endedBy: null, intoIds: [], revision: () => 'revision + 1' })
      .where({ farmId, id: In(gone.map((each) => each.id)) }).execute()
    for (const { id: subjectId, code } of gone) await appendJournal(services, manager, actor, { action: 'block.reopened', subjectId, detail: { code } })
    const open = gone.map((each): Block => ({ ...each, endedOn: null, endedBy: null, intoIds: [], revision: each.revision + 1 }))
    return { ended: await presentBlocks(manager, ended), open: await presentBlocks(manager, open) }
  })
}

async function assertUntouched(manager: EntityManager, farmId: string, blocks: readonly Block[]): Promise<void> {
  const blockId = In(blocks.map(({ id }) => id))
  const changed = blocks.find(({ revision, endedOn }) => revision > 1 || endedOn !== null)
  let isUsed = changed !== undefined
  for (const entity of [RecordLine, Planting, Bed, FarmEventBlock]) isUsed ||= await manager.existsBy(entity, { farmId, blockId })
  if (isUsed) throw new AppError('conflict', 'block.reopen_used', { errors: [{ path: 'id', code: 'block.reopen_used' }] })
}
