import { bbox, feature, featureCollection, intersect } from '@turf/turf'
import { areTooFine } from './edgeMeetings.ts'
import type { Boundary, Position, Ring } from './geometryTypes.ts'
import { measurePolygon } from './measurePolygon.ts'

export interface NamedBoundary { id: string; code: string; geometry: Boundary }

export interface Overlap {
  id: string
  code: string
  /** Shared ground, square metres. */
  areaM2: number
  /** Shared ground over the smaller of the two, 0 to 1; over 0.05 is worth a question. */
  share: number
}

/** Shared ground below this is the sliver of a common edge. */
const SLIVER_M2 = 1

/**
 * Ground that two valid boundaries share, square metres on the ellipsoid; 0 where they only touch or are too fine to clip.
 */
export function overlapShare(a: Boundary, b: Boundary): number {
  if (!doBoxesMeet(a, b) || areTooFine(a, b)) return 0
  const shared = intersect(featureCollection([feature(a), feature(b)]))
  return shared === null ? 0 : measurePolygon(toBoundary(shared.geometry)).areaM2
}

/** The boundaries whose ground shared with one cannot be worked out in good time; see `areTooFine`. */
export function findTooFine(geometry: Boundary, others: readonly NamedBoundary[]): NamedBoundary[] {
  return others.filter((other) => doBoxesMeet(geometry, other.geometry) && areTooFine(geometry, other.geometry))
}

/** The boundaries that share more than 1 m² with one, largest shared ground first; those of `findTooFine` are left out. */
export function findOverlaps(geometry: Boundary, others: readonly NamedBoundary[]): Overlap[] {
  const ownM2 = measurePolygon(geometry).areaM2
  return others
    .map((other) => ({ other, areaM2: overlapShare(geometry, other.geometry) }))
    .filter(({ areaM2 }) => areaM2 > SLIVER_M2)
    .map(({ other, areaM2 }) => {
      const smallerM2 = Math.min(ownM2, measurePolygon(other.geometry).areaM2)
      return { id: other.id, code: other.code, areaM2, share: Math.min(1, areaM2 / smallerM2) }
    })
    .sort((a, b) => b.areaM2 - a.areaM2 || (a.id < b.id ? -1 : 1))
}

function doBoxesMeet(a: Boundary, b: Boundary): boolean {
  const [westA, southA, eastA, northA] = bbox(a)
  const [westB, southB, eastB, northB] = bbox(b)
  return westA <= eastB && westB <= eastA && southA <= northB && southB <= northA
}

function toBoundary(shape: { type: 'Polygon'; coordinates: number[][][] } | { type: 'MultiPolygon'; coordinates: number[][][][] }): Boundary {
  const toRing = (ring: number[][]): Ring => ring.map(([lon = 0, lat = 0]): Position => [lon, lat])
  return shape.type === 'Polygon'
    ? { type: 'Polygon', coordinates: shape.coordinates.map(toRing) }
    : { type: 'MultiPolygon', coordinates: shape.coordinates.map((rings) => rings.map(toRing)) }
}
