import { In, IsNull, Not, type EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import { firstCorner } from '../../../shared/geo/boundaryParts.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import { findOverlaps, type NamedBoundary } from '../../../shared/geo/findOverlaps.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { FAR_KM } from '../../../shared/geo/isFarFrom.ts'
import { looksSwapped } from '../../../shared/geo/looksSwapped.ts'
import { Block } from '../../entities/Block.ts'
import { invalid, unlikely, type FieldError } from '../../errors.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

/** A shared sliver under this part of the smaller block is drawing, not a mistake. */
const OVERLAP_SHARE = 0.05

/** A boundary cleaned, or every reason why it cannot stand. @param path where it was sent, `geometry` or `parts.2.geometry`. */
export function findBoundaryFaults(sent: unknown, path = 'geometry'): { geometry: Boundary | null; faults: FieldError[] } {
  const { geometry, findings } = checkBoundary(sent)
  return { geometry, faults: findings.map(({ code, params, path: inside }) => ({ path: inside ? `${path}.${inside}` : path, code, params })) }
}

/** A boundary cleaned. @throws {AppError} invalid-input with every reason why it cannot stand. */
export function readBoundary(sent: unknown, path = 'geometry'): Boundary {
  const { geometry, faults } = findBoundaryFaults(sent, path)
  if (!geometry || faults.length > 0) throw invalid(faults)
  return geometry
}

/** Outlines of the farm's blocks that have not ended. @param except ids to leave out: the block itself. */
export function listOutlines(manager: EntityManager, farmId: string, except: readonly string[] = []): Promise<NamedBoundary[]> {
  return manager.find(Block, {
    select: { id: true, code: true, geometry: true },
    where: { farmId, endedOn: IsNull(), ...(except.length > 0 && { id: Not(In([...except])) }) },
  })
}

/** What is unlikely about a boundary among others: ground shared with another block, or a place far from all of them. */
export function findBoundaryDoubts(geometry: Boundary, others: readonly NamedBoundary[], path = 'geometry'): FieldError[] {
  return [...findOverlapDoubts(geometry, others, path), ...findFarDoubts(geometry, others, path)]
}

/** @throws {AppError} `unlikely` with the doubts for which no reason was sent. */
export function assertLikely(doubts: readonly FieldError[], acknowledged: Acknowledged): void {
  const passed = new Set(acknowledged.map(({ code }) => code))
  const open = doubts.filter(({ code }) => !passed.has(code))
  if (open.length > 0) throw unlikely(open)
}

function findOverlapDoubts(geometry: Boundary, others: readonly NamedBoundary[], path: string): FieldError[] {
  const { overlaps, tooFine } = findOverlaps(geometry, others)
  const shared = overlaps.filter(({ share }) => share > OVERLAP_SHARE).map(({ code, areaM2 }) => ({
    path,
    code: 'geometry.overlap',
    params: { code, areaHa: Number((areaM2 / M2_PER_HA).toFixed(2)) },
  }))
  return [...shared, ...tooFine.map(({ code }) => ({ path, code: 'geometry.overlap_unknown', params: { code } }))]
}

function findFarDoubts(geometry: Boundary, others: readonly NamedBoundary[], path: string): FieldError[] {
  const nearest = others.map((other) => ({ other, km: distanceKm(geometry, other.geometry) })).sort((a, b) => a.km - b.km)[0]
  if (!nearest || nearest.km <= FAR_KM) return []
  const place = firstCorner(nearest.other.geometry)
  const code = place && looksSwapped(geometry, place) ? 'geometry.swapped' : 'geometry.far_from_farm'
  return [{ path, code, params: { km: Math.round(nearest.km) } }]
}
