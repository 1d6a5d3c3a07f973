import { boundaryParts } from './boundaryParts.ts'
import { metresPerDegree } from './ellipsoid.ts'
import type { Boundary, Position } from './geometryTypes.ts'
import { middleOf } from './middleOf.ts'

/** Metres east and north of the plan's origin. */
export type PlanPoint = [number, number]
export interface PlanRing { points: PlanPoint[]; isHole: boolean }
export interface Plan {
  /** [longitude, latitude] of 0, 0; give it to other boundaries to lay them on the same plan. */
  origin: Position
  rings: PlanRing[]
  /** Lowest x and y of all rings, metres. */
  minX: number
  minY: number
  widthM: number
  heightM: number
}

/**
 * A boundary as metres on a plan, x east and y north, for drawing to scale: equirectangular on the ellipsoid about the origin,
 * within 0.1 % over a farm.
 * @param origin the plan's 0, 0; the boundary's own middle unless given.
 * @source radii of curvature at the origin, see `metresPerDegree`.
 */
export function toPlan({ geometry, origin = middleOf(geometry) }: { geometry: Boundary; origin?: Position }): Plan {
  const [lon0, lat0] = origin
  const metres = metresPerDegree(lat0)
  const rings = boundaryParts(geometry).flatMap((parts) =>
    parts.map((ring, index) => ({
      isHole: index > 0,
      points: ring.map(([lon, lat]): PlanPoint => [(lon - lon0) * metres.east, (lat - lat0) * metres.north]),
    })),
  )
  const xs = rings.flatMap(({ points }) => points.map(([x]) => x))
  const ys = rings.flatMap(({ points }) => points.map(([, y]) => y))
  const minX = Math.min(...xs)
  const minY = Math.min(...ys)
  return { origin, rings, minX, minY, widthM: Math.max(...xs) - minX, heightM: Math.max(...ys) - minY }
}

/**
 * The longest of 1, 2 or 5 times a power of ten that fits into a length.
 * @param metres room for the bar, above 0. @returns metres.
 * @throws {RangeError} if there is no room.
 */
export function niceScaleBar(metres: number): number {
  if (!Number.isFinite(metres) || metres <= 0) throw new RangeError(`metres must be above 0, is ${metres}`)
  const exponent = Math.floor(Math.log10(metres))
  const candidates = [exponent - 1, exponent, exponent + 1].flatMap((power) => [1, 2, 5].map((step) => Number(`${step}e${power}`)))
  return candidates.filter((length) => length <= metres).at(-1) ?? metres
}
