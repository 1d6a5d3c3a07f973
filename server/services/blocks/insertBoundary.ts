import type { EntityManager } from 'typeorm'
import type { QueryDeepPartialEntity } from 'typeorm/query-builder/QueryPartialEntity.js'
import { personOf, type FarmActor } from '../../database/actor.ts'
import type { Block } from '../../entities/Block.ts'
import { BlockBoundary } from '../../entities/BlockBoundary.ts'
import type { Services } from '../services.ts'

/** Writes the outline that a block has now as the boundary version that it names. */
export async function insertBoundary(
  services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor,
  { block, drawnOn, note }: { block: Block; drawnOn: string; note: string | null },
): Promise<void> {
  const { farmId, id: blockId, version, geometry, areaM2, perimeterM, acknowledged } = block
  const row: BlockBoundary = { farmId, blockId, version, geometry, areaM2, perimeterM, drawnOn, note, acknowledged, byId: personOf(actor), at: services.clock.now() }
  await manager.insert(BlockBoundary, row as QueryDeepPartialEntity<BlockBoundary>)
}
