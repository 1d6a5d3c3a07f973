import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Block as BlockAnswer, CreateBlock } from '../../../shared/contract/block.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import { firstCorner } from '../../../shared/geo/boundaryParts.ts'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import { findOverlaps, type NamedBoundary } from '../../../shared/geo/findOverlaps.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { FAR_KM } from '../../../shared/geo/isFarFrom.ts'
import { looksSwapped } from '../../../shared/geo/looksSwapped.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Block } from '../../entities/Block.ts'
import { invalid, unlikely, type FieldError } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { presentBlock } from './presentBlock.ts'

const HECTARE_M2 = 10_000
/** A shared sliver under this part of the smaller block is drawing, not a mistake. */
const OVERLAP_SHARE = 0.05

/**
 * Makes a block from a boundary: impossible ones are refused with every reason, unlikely ones pass when acknowledged.
 * @returns the block, and whether this call made it.
 */
export async function createBlock(services: Services, actor: FarmActor, input: CreateBlock): Promise<{ made: boolean; block: BlockAnswer }> {
  const { geometry, findings } = checkBoundary(input.geometry)
  if (!geometry || findings.length > 0) {
    throw invalid(findings.map(({ code, params, path }) => ({ path: path ? `geometry.${path}` : 'geometry', code, params })))
  }
  const measure = measurePolygon(geometry)
  const creationDigest = digestOf({ ...input, geometry })
  return services.database.inFarm(actor, async (manager) => {
    const repeated = await findRepeat(manager, Block, { farmId: actor.farmId, id: input.id, creationDigest })
    if (repeated) return { made: false, block: presentBlock(repeated) }
    const others = await manager.find(Block, { select: { id: true, code: true, geometry: true }, where: { farmId: actor.farmId } })
    assertLikely(geometry, others, input.acknowledged)
    const row: Block = {
      farmId: actor.farmId,
      id: input.id,
      code: input.code,
      name: input.name,
      crop: input.crop,
      geometry,
      areaM2: String(measure.areaM2),
      perimeterM: String(measure.perimeterM),
      version: 1,
      revision: 1,
      acknowledged: input.acknowledged,
      creationDigest,
      createdAt: services.clock.now(),
    }
    const { made, stored } = await insertOnce(manager, Block, row, { path: 'code', code: 'code.taken', params: { code: input.code } })
    if (made) await appendJournal(services, manager, actor, { action: 'block.created', subjectId: input.id, detail: { code: input.code } })
    return { made, block: presentBlock(stored) }
  })
}

function assertLikely(geometry: Boundary, others: NamedBoundary[], acknowledged: Acknowledged): void {
  const passed = new Set(acknowledged.map(({ code }) => code))
  const doubts = [...findOverlapDoubts(geometry, others), ...findFarDoubts(geometry, others)].filter(({ code }) => !passed.has(code))
  if (doubts.length > 0) throw unlikely(doubts)
}

function findOverlapDoubts(geometry: Boundary, others: NamedBoundary[]): FieldError[] {
  const { overlaps, tooFine } = findOverlaps(geometry, others)
  const shared = overlaps.filter(({ share }) => share > OVERLAP_SHARE).map(({ code, areaM2 }) => ({
    path: 'geometry',
    code: 'geometry.overlap',
    params: { code, areaHa: Number((areaM2 / HECTARE_M2).toFixed(2)) },
  }))
  return [...shared, ...tooFine.map(({ code }) => ({ path: 'geometry', code: 'geometry.overlap_unknown', params: { code } }))]
}

function findFarDoubts(geometry: Boundary, others: NamedBoundary[]): FieldError[] {
  const nearest = others.map((other) => ({ other, km: distanceKm(geometry, other.geometry) })).sort((a, b) => a.km - b.km)[0]
  if (!nearest || nearest.km <= FAR_KM) return []
  const place = firstCorner(nearest.other.geometry)
  const code = place && looksSwapped(geometry, place) ? 'geometry.swapped' : 'geometry.far_from_farm'
  return [{ path: 'geometry', code, params: { km: Math.round(nearest.km) } }]
}
