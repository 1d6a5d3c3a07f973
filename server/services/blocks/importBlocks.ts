import { In, type EntityManager } from 'typeorm'
import type { CreateBlock } from '../../../shared/contract/block.ts'
import type { BlocksImported, ImportBlocks } from '../../../shared/contract/blockImport.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { AppError, invalid, unlikely, type FieldError } from '../../errors.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { drawingDay } from './drawingDay.ts'
import { insertBlock } from './insertBlock.ts'
import { findBoundaryDoubts, findBoundaryFaults, listOutlines } from './judgeBoundary.ts'
import { openOutlineBook } from './nearOutlines.ts'
import { presentBlocks } from './presentBlock.ts'

/** A block as it was sent, its outline cleaned, and its place among those sent. */
interface Incoming { index: number; input: CreateBlock; geometry: Boundary; creationDigest: string }

/**
 * Makes several blocks, all or none: each is judged as if it were drawn, after those before it. What is found names its place,
 * `blocks.3.geometry`; all of it is said at once.
 * @returns the blocks in their order, and whether this call made any of them.
 */
export async function importBlocks(services: Services, actor: FarmActor, { blocks }: ImportBlocks): Promise<{ made: boolean; imported: BlocksImported }> {
  const incoming = readAll(blocks)
  return services.database.inFarm(actor, async (manager) => {
    const present = await findPresent(manager, actor, incoming)
    const fresh = incoming.filter(({ input }) => !present.has(input.id))
    await assertCodesFree(manager, actor, fresh)
    await assertAllLikely(manager, actor, fresh)
    let made = false
    for (const { index, input, geometry, creationDigest } of fresh) {
      const drawnOn = drawingDay(services, actor, input.drawnOn)
      const inserted = await atPlace(index, () => insertBlock(services, manager, actor, {
        ...input, geometry, drawnOn, note: input.note ?? null, creationDigest, fromIds: [], land: null,
      }))
      made ||= inserted.made
      present.set(input.id, inserted.stored)
    }
    const rows = incoming.flatMap(({ input }) => present.get(input.id) ?? [])
    return { made, imported: { items: await presentBlocks(manager, rows) } }
  })
}

function readAll(blocks: readonly CreateBlock[]): Incoming[] {
  const faults: FieldError[] = findTwice(blocks)
  const read = blocks.flatMap((input, index): Incoming[] => {
    const { geometry, faults: found } = findBoundaryFaults(input.geometry, `blocks.${index}.geometry`)
    faults.push(...found)
    return geometry === null ? [] : [{ index, input, geometry, creationDigest: digestOf({ ...input, geometry }) }]
  })
  if (faults.length > 0) throw invalid(faults)
  return read
}

/** Ids and codes that stand twice in what was sent. */
function findTwice(blocks: readonly CreateBlock[]): FieldError[] {
  const [ids, codes] = [new Set<string>(), new Set<string>()]
  return blocks.flatMap(({ id, code }, index): FieldError[] => {
    const found: FieldError[] = []
    if (ids.has(id)) found.push({ path: `blocks.${index}.id`, code: 'idempotency.mismatch' })
    if (codes.has(code.toLowerCase())) found.push({ path: `blocks.${index}.code`, code: 'code.taken', params: { code } })
    ids.add(id)
    codes.add(code.toLowerCase())
    return found
  })
}

/** Those that the same command made before, by id. @throws {AppError} `idempotency.mismatch` where an id holds other content. */
async function findPresent(manager: EntityManager, { farmId }: FarmActor, incoming: readonly Incoming[]): Promise<Map<string, Block>> {
  const rows = await manager.findBy(Block, { farmId, id: In(incoming.map(({ input }) => input.id)) })
  const present = new Map(rows.map((row) => [row.id, row]))
  const mismatches = incoming.filter(({ input, creationDigest }) => (present.get(input.id)?.creationDigest ?? creationDigest) !== creationDigest)
  if (mismatches.length > 0) throw invalid(mismatches.map(({ index }) => ({ path: `blocks.${index}.id`, code: 'idempotency.mismatch' })))
  return present
}

async function assertCodesFree(manager: EntityManager, { farmId }: FarmActor, fresh: readonly Incoming[]): Promise<void> {
  const rows: { code: string }[] = await manager.createQueryBuilder(Block, 'block').select('lower(block.code)', 'code')
    .where('block.farmId = :farmId AND block.endedOn IS NULL', { farmId }).getRawMany()
  const taken = new Set(rows.map(({ code }) => code))
  const errors = fresh.filter(({ input }) => taken.has(input.code.toLowerCase()))
    .map(({ index, input: { code } }): FieldError => ({ path: `blocks.${index}.code`, code: 'code.taken', params: { code } }))
  if (errors.length > 0) throw new AppError('conflict', 'conflict', { errors })
}

/** @throws {AppError} `unlikely` with every doubt for which its own block brings no reason. */
async function assertAllLikely(manager: EntityManager, { farmId }: FarmActor, fresh: readonly Incoming[]): Promise<void> {
  const book = openOutlineBook(await listOutlines(manager, farmId))
  const open = fresh.flatMap(({ index, input, geometry }) => {
    const outline = { id: input.id, code: input.code, geometry }
    const doubts = findBoundaryDoubts(geometry, book.near(outline), `blocks.${index}.geometry`)
    book.add(outline)
    const passed = new Set(input.acknowledged.map(({ code }) => code))
    return doubts.filter(({ code }) => !passed.has(code))
  })
  if (open.length > 0) throw unlikely(open)
}

/** What is refused while one block is written names its place. */
async function atPlace<Result>(index: number, write: () => Promise<Result>): Promise<Result> {
  try {
    return await write()
  } catch (error) {
    if (!(error instanceof AppError)) throw error
    const { refusal, code, errors } = error
    throw new AppError(refusal, code, { errors: errors.map((each) => ({ ...each, path: `blocks.${index}.${each.path}` })) })
  }
}
