import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { PutLand } from '../../../shared/contract/land.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { farmToday } from './drawingDay.ts'
import { assertCurrent, lockBlock } from './lockBlocks.ts'
import { presentBlock } from './presentBlock.ts'

/** Says how the land of a block stands; what was said before stays in the journal. @throws {AppError} not-found, `stale`, `block.already_ended`, `time.future`. */
export async function putLand(services: Services, actor: FarmActor, id: string, { revision, ...land }: PutLand): Promise<BlockAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const block = await lockBlock(manager, actor, id)
    await assertCurrent(manager, block, revision)
    if (land.lastProhibited !== null && land.lastProhibited.on > farmToday(services, actor)) throw invalid([{ path: 'lastProhibited.on', code: 'time.future' }])
    const changes = { land, revision: revision + 1 }
    await updateRow(manager, Block, { farmId: actor.farmId, id }, changes)
    await appendJournal(services, manager, actor, { action: 'block.land_set', subjectId: id, detail: { code: block.code, before: block.land, land } })
    return presentBlock(manager, { ...block, ...changes })
  })
}
