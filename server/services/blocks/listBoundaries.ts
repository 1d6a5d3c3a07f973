import { In, type EntityManager } from 'typeorm'
import type { BoundaryVersion } from '../../../shared/contract/blockChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { BlockBoundary } from '../../entities/BlockBoundary.ts'
import { Person } from '../../entities/Person.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'

/** Every version of a block's outline, newest first, with the signed records that rest on it. @throws {AppError} not-found. */
export async function listBoundaries(services: Services, { farmId, ...actor }: FarmActor, id: string): Promise<{ items: BoundaryVersion[] }> {
  return services.database.inFarm({ farmId, ...actor }, async (manager) => {
    if (!(await manager.existsBy(Block, { farmId, id }))) throw notFound()
    const versions = await manager.find(BlockBoundary, { where: { farmId, blockId: id }, order: { version: 'DESC' } })
    const ids = versions.flatMap(({ byId }) => byId ?? [])
    const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(ids) } })
    const resting = await listResting(manager, farmId, id)
    return {
      items: versions.map(({ version, geometry, areaM2, perimeterM, drawnOn, note, byId, at }) => ({
        version, geometry, areaM2: Number(areaM2), perimeterM: Number(perimeterM), drawnOn, note,
        by: people.find((person) => person.id === byId)?.name ?? null, at: at.toISOString(),
        records: resting.filter((record) => record.version === version).map(({ record_id, number }) => ({ id: record_id, number })),
      })),
    }
  })
}

interface RestingRow { record_id: string; number: string; version: number }

/** Signed records of a block as their newest version says it, newest first, each with the boundary version that it keeps. */
function listResting(manager: EntityManager, farmId: string, blockId: string): Promise<RestingRow[]> {
  return manager.query(
    `SELECT v.record_id, v.number, (SELECT (b->>'version')::integer FROM jsonb_array_elements(v.canonical_text::jsonb->'blocks') b WHERE b->>'id' = $2::uuid::text LIMIT 1) AS version
     FROM application_records r JOIN record_versions v ON v.farm_id = r.farm_id AND v.record_id = r.id AND v.version = r.version
     WHERE r.farm_id = $1 AND EXISTS (SELECT 1 FROM record_lines l WHERE l.farm_id = r.farm_id AND l.record_id = r.id AND l.block_id = $2::uuid)
     ORDER BY v.season DESC, r.number DESC`,
    [farmId, blockId],
  )
}
