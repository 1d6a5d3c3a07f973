import { In, type EntityManager } from 'typeorm'
import type { BlocksChanged, SplitBlock } from '../../../shared/contract/blockChanges.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { findSplitFaults } from '../../../shared/geo/findSplitFaults.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { invalid, type FieldError } from '../../errors.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { assertCodeFree } from './assertCodeFree.ts'
import { drawingDay } from './drawingDay.ts'
import { endBlocks } from './endBlocks.ts'
import { insertBlock, type NewBlock } from './insertBlock.ts'
import { findBoundaryFaults } from './judgeBoundary.ts'
import { assertCurrent, lockBlock } from './lockBlocks.ts'
import { presentBlocks } from './presentBlock.ts'

/**
 * Cuts a block into parts, all or nothing: it ends, the parts begin with its crop and land. A repeat answers with what is there.
 * @throws {AppError} not-found, `stale`, `block.already_ended`, `code.taken`, or invalid-input where the parts are not the whole, each once.
 */
export async function splitBlock(services: Services, actor: FarmActor, id: string, input: SplitBlock): Promise<BlocksChanged> {
  const outlines = readOutlines(input)
  return services.database.inFarm(actor, async (manager) => {
    const block = await lockBlock(manager, actor, id)
    const drawnOn = drawingDay(services, actor, input.drawnOn)
    const parts = input.parts.map((part, index): NewBlock => ({
      id: part.id, code: part.code, name: part.name, crop: part.crop ?? block.crop,
      geometry: outlines[index] ?? block.geometry, drawnOn, note: null, acknowledged: [],
      creationDigest: digestOf({ ...part, geometry: outlines[index], from: id }), fromIds: [id], land: block.land,
    }))
    const repeated = await findRepeat(manager, block, parts)
    if (repeated) return present(manager, [block], repeated)
    await assertCurrent(manager, block, input.revision)
    const faults = findSplitFaults(block.geometry, outlines).map(({ part, code, params }): FieldError => ({ path: part === null ? 'parts' : `parts.${part}.geometry`, code, params }))
    if (faults.length > 0) throw invalid(faults)
    for (const [index, part] of parts.entries()) await assertCodeFree(manager, actor.farmId, part.code, [id], `parts.${index}.code`)
    const ended = await endBlocks(services, manager, actor, [block], { by: 'split', intoIds: parts.map((part) => part.id) })
    const open: Block[] = []
    for (const part of parts) {
      const { made, stored } = await insertBlock(services, manager, actor, part)
      if (!made) throw invalid([{ path: 'parts', code: 'idempotency.mismatch' }])
      open.push(stored)
    }
    return present(manager, ended, open)
  })
}

/** Every part's outline cleaned, ids and codes each once. @throws {AppError} invalid-input with every fault of every part. */
function readOutlines({ parts }: SplitBlock): Boundary[] {
  const read = parts.map(({ geometry }, index) => findBoundaryFaults(geometry, `parts.${index}.geometry`))
  const faults = read.flatMap((each) => each.faults)
  parts.forEach(({ id, code }, index) => {
    const before = parts.slice(0, index)
    if (before.some((other) => other.id === id)) faults.push({ path: `parts.${index}.id`, code: 'idempotency.mismatch' })
    if (before.some((other) => other.code.toLowerCase() === code.toLowerCase())) faults.push({ path: `parts.${index}.code`, code: 'code.taken', params: { code } })
  })
  const outlines = read.flatMap(({ geometry }) => (geometry === null ? [] : [geometry]))
  if (faults.length > 0) throw invalid(faults)
  return outlines
}

/** The parts, where the same command has cut the block already. */
async function findRepeat(manager: EntityManager, block: Block, parts: readonly NewBlock[]): Promise<Block[] | null> {
  if (block.endedBy !== 'split' || block.intoIds.join() !== parts.map(({ id }) => id).join()) return null
  const made = await manager.findBy(Block, { farmId: block.farmId, id: In(block.intoIds) })
  const inOrder = parts.flatMap((part) => made.find(({ id, creationDigest }) => id === part.id && creationDigest === part.creationDigest) ?? [])
  return inOrder.length === parts.length ? inOrder : null
}

async function present(manager: EntityManager, ended: Block[], open: Block[]): Promise<BlocksChanged> {
  return { ended: await presentBlocks(manager, ended), open: await presentBlocks(manager, open) }
}
