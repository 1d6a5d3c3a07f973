import { bbox, feature, featureCollection, intersect } from '@turf/turf'
import { asBoundary } from './asBoundary.ts'
import { areTooFine } from './edgeMeetings.ts'
import type { Boundary } from './geometryTypes.ts'
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

/** What a boundary has in common with others. */
export interface SharedGround {
  /** Those that share more than 1 m² with it, largest shared ground first. */
  overlaps: Overlap[]
  /** Those whose shared ground cannot be worked out in good time; see `areTooFine`. */
  tooFine: NamedBoundary[]
}

/** The ground that a valid boundary shares with others, each compared once. */
export function findOverlaps(geometry: Boundary, others: readonly NamedBoundary[]): SharedGround {
  const near = others.filter((other) => doBoxesMeet(geometry, other.geometry))
  const tooFine = near.filter((other) => areTooFine(geometry, other.geometry))
  const ownM2 = measurePolygon(geometry).areaM2
  const overlaps = near
    .filter((other) => !tooFine.includes(other))
    .map((other) => ({ other, areaM2: sharedM2(geometry, other.geometry) }))
    .filter(({ areaM2 }) => areaM2 > SLIVER_M2)
    .map(({ other, areaM2 }) => {
      const smallerM2 = Math.min(ownM2, measurePolygon(other.geometry).areaM2)
      return { id: other.id, code: other.code, areaM2, share: Math.min(1, areaM2 / smallerM2) }
    })
    .sort((a, b) => b.areaM2 - a.areaM2 || (a.id < b.id ? -1 : 1))
  return { overlaps, tooFine }
}

/** Ground that two valid boundaries share, square metres on the ellipsoid; 0 where they only touch. Not for those that `areTooFine`. */
export function sharedM2(a: Boundary, b: Boundary): number {
  const shared = intersect(featureCollection([feature(a), feature(b)]))
  return shared === null ? 0 : measurePolygon(asBoundary(shared.geometry)).areaM2
}

function doBoxesMeet(a: Boundary, b: Boundary): boolean {
  const [westA, southA, eastA, northA] = bbox(a)
  const [westB, southB, eastB, northB] = bbox(b)
  return westA <= eastB && westB <= eastA && southA <= northB && southB <= northA
}
