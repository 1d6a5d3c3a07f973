import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { UpdateBlock } from '../../../shared/contract/blockChanges.ts'
import { isSameOutline } from '../../../shared/geo/isSameOutline.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { assertCodeFree } from './assertCodeFree.ts'
import { drawingDay } from './drawingDay.ts'
import { insertBoundary } from './insertBoundary.ts'
import { assertLikely, findBoundaryDoubts, listOutlines, readBoundary } from './judgeBoundary.ts'
import { assertCurrent, lockBlock } from './lockBlocks.ts'
import { presentBlock } from './presentBlock.ts'

/**
 * Changes a block. Another outline, judged as a new block's, makes a boundary version; signed records keep theirs.
 * @throws {AppError} not-found, `stale`, `block.already_ended`, `code.taken`, invalid-input, or `unlikely` while something has no reason.
 */
export async function updateBlock(services: Services, actor: FarmActor, id: string, input: UpdateBlock): Promise<BlockAnswer> {
  const geometry = input.geometry === undefined ? null : readBoundary(input.geometry)
  return services.database.inFarm(actor, async (manager) => {
    const block = await lockBlock(manager, actor, id)
    await assertCurrent(manager, block, input.revision)
    const drawnOn = drawingDay(services, actor, input.drawnOn)
    const changes: Partial<Block> = { revision: block.revision + 1 }
    if (input.code !== undefined) changes.code = input.code
    if (input.name !== undefined) changes.name = input.name
    if (input.crop !== undefined) changes.crop = input.crop
    await assertCodeFree(manager, actor.farmId, input.code ?? block.code, [id])
    const redrawn = geometry !== null && !isSameOutline(geometry, block.geometry)
    if (redrawn) {
      assertLikely(findBoundaryDoubts(geometry, await listOutlines(manager, actor.farmId, [id])), input.acknowledged)
      const { areaM2, perimeterM } = measurePolygon(geometry)
      Object.assign(changes, { geometry, areaM2: String(areaM2), perimeterM: String(perimeterM), version: block.version + 1, acknowledged: input.acknowledged })
    }
    const written: Block = { ...block, ...changes }
    await updateRow(manager, Block, { farmId: actor.farmId, id }, changes)
    if (redrawn) await insertBoundary(services, manager, actor, { block: written, drawnOn, note: input.note ?? null })
    await appendJournal(services, manager, actor, {
      action: redrawn ? 'block.redrawn' : 'block.updated', subjectId: id, detail: { code: written.code, version: written.version },
    })
    return presentBlock(manager, written)
  })
}
