import { In, type EntityManager } from 'typeorm'
import type { BlockEnd } from '../../../shared/contract/block.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { farmToday } from './drawingDay.ts'

/** Ends blocks today: they stay readable and bear their records, and take no new ones. @returns them as they are now. */
export async function endBlocks(
  services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor,
  blocks: readonly Block[], { by, intoIds }: { by: BlockEnd; intoIds: string[] },
): Promise<Block[]> {
  const changes = { endedOn: farmToday(services, actor), endedBy: by, intoIds }
  await manager.createQueryBuilder().update(Block).set({ ...changes, revision: () => 'revision + 1' })
    .where({ farmId: actor.farmId, id: In(blocks.map(({ id }) => id)) }).execute()
  for (const { id, code } of blocks) await appendJournal(services, manager, actor, { action: `block.ended_by_${by}`, subjectId: id, detail: { code, intoIds } })
  return blocks.map((block) => ({ ...block, ...changes, revision: block.revision + 1 }))
}
