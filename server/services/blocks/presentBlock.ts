import type { EntityManager } from 'typeorm'
import type { Block as BlockAnswer } from '../../../shared/contract/block.ts'
import type { Block } from '../../entities/Block.ts'

type Counts = BlockAnswer['counts']
const NOTHING: Counts = { plants: null, beds: null, rows: null, rowM: null }

/** A block as the contract shows it. */
export async function presentBlock(manager: EntityManager, block: Block): Promise<BlockAnswer> {
  const [answer] = await presentBlocks(manager, [block])
  if (!answer) throw new RangeError('A block was lost while it was shown')
  return answer
}

/** Blocks as the contract shows them, with what is counted on each. */
export async function presentBlocks(manager: EntityManager, blocks: readonly Block[]): Promise<BlockAnswer[]> {
  const counts = await readCounts(manager, blocks)
  return blocks.map((block) => ({
    id: block.id,
    code: block.code,
    name: block.name,
    crop: block.crop,
    geometry: block.geometry,
    areaM2: Number(block.areaM2),
    perimeterM: Number(block.perimeterM),
    version: block.version,
    revision: block.revision,
    endedOn: block.endedOn,
    endedBy: block.endedBy,
    fromIds: block.fromIds,
    intoIds: block.intoIds,
    land: block.land,
    counts: counts.get(block.id) ?? NOTHING,
    createdAt: block.createdAt.toISOString(),
  }))
}

interface CountRow { block_id: string; plants: string | null; beds: string | null; rows: string | null; row_m: string | null }

/** Plants of the plantings that stand; where none was counted, those of beds and rows. */
async function readCounts(manager: EntityManager, blocks: readonly Block[]): Promise<Map<string, Counts>> {
  const [first] = blocks
  if (!first) return new Map()
  const rows: CountRow[] = await manager.query(COUNTS, [first.farmId, blocks.map(({ id }) => id)])
  const number = (text: string | null) => (text === null ? null : Number(text))
  return new Map(rows.map((row) => [row.block_id, { plants: number(row.plants), beds: number(row.beds), rows: number(row.rows), rowM: number(row.row_m) }]))
}

const COUNTS = `WITH planted AS (SELECT block_id, sum(plants) AS plants FROM plantings
    WHERE farm_id = $1 AND block_id = ANY ($2) AND removed_on IS NULL GROUP BY block_id),
  laid AS (SELECT block_id, sum(plants) AS plants, sum(count) FILTER (WHERE kind = 'bed') AS beds,
      sum(count) FILTER (WHERE kind = 'row') AS rows, sum(count * length_m) FILTER (WHERE kind = 'row') AS row_m
    FROM beds WHERE farm_id = $1 AND block_id = ANY ($2) AND ended_on IS NULL GROUP BY block_id)
  SELECT block_id, coalesce(planted.plants, laid.plants) AS plants, laid.beds, laid.rows, laid.row_m
  FROM planted FULL JOIN laid USING (block_id)`
