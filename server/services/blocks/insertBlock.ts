import type { EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Land } from '../../../shared/contract/land.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { appendJournal } from '../appendJournal.ts'
import { insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { insertBoundary } from './insertBoundary.ts'

/** A block to be written: its outline cleaned and judged. */
export interface NewBlock {
  id: string
  code: string
  name: string
  crop: string | null
  geometry: Boundary
  drawnOn: string
  note: string | null
  acknowledged: Acknowledged
  creationDigest: string
  /** Blocks it is cut from or put together from. */
  fromIds: string[]
  land: Land | null
}

/** Writes a block, its first boundary version and the journal's entry. @throws {AppError} `code.taken`, `idempotency.mismatch`. */
export async function insertBlock(
  services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor, block: NewBlock,
): Promise<{ made: boolean; stored: Block }> {
  const { id, code, name, crop, geometry, drawnOn, note, acknowledged, creationDigest, fromIds, land } = block
  const measure = measurePolygon(geometry)
  const row: Block = {
    farmId: actor.farmId, id, code, name, crop, geometry,
    areaM2: String(measure.areaM2), perimeterM: String(measure.perimeterM),
    version: 1, revision: 1, endedOn: null, endedBy: null, fromIds, intoIds: [], land,
    acknowledged, creationDigest, createdAt: services.clock.now(),
  }
  const { made, stored } = await insertOnce(manager, Block, row, { path: 'code', code: 'code.taken', params: { code } })
  if (!made) return { made, stored }
  await insertBoundary(services, manager, actor, { block: row, drawnOn, note })
  await appendJournal(services, manager, actor, { action: 'block.created', subjectId: id, detail: { code } })
  return { made, stored: row }
}
