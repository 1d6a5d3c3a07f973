import type { Boundary, Position, Ring } from './geometryTypes.ts'
import { boundaryParts } from './boundaryParts.ts'
import { GRID_PER_DEGREE, type GridRing } from './gridRing.ts'

/** A position in whole grid units of 1e-7 degrees, [east, north]. */
export type GridPoint = readonly [number, number]

/** The grid point nearest a position. Adding 0 turns −0 into 0. */
export const toGridPoint = ([lon, lat]: Position): GridPoint => [
  Math.round(lon * GRID_PER_DEGREE) + 0, Math.round(lat * GRID_PER_DEGREE) + 0,
]

export const fromGridPoint = ([x, y]: GridPoint): Position => [x / GRID_PER_DEGREE, y / GRID_PER_DEGREE]

export const isSamePoint = (a: GridPoint, b: GridPoint): boolean => a[0] === b[0] && a[1] === b[1]

/** Twice the signed area of a→b→c, grid units squared: above 0 where c lies left of a→b. */
export const turnOf = (a: GridPoint, b: GridPoint, c: GridPoint): number =>
  (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0])

/** Grid points as the flat ring that relations are worked out on. */
export const toFlatRing = (ring: readonly GridPoint[]): GridRing => ({ x: ring.map(([x]) => x), y: ring.map(([, y]) => y) })

/** The rings of a boundary in grid points, one list a polygon, the first point of a ring not repeated. */
export function toGridParts(boundary: Boundary): GridPoint[][][] {
  return boundaryParts(boundary).map((rings) => rings.map((ring) => ring.slice(0, -1).map(toGridPoint)))
}

/** Rings of grid points as a boundary, each ring closed; a Polygon where there is one part. */
export function fromGridParts(parts: readonly (readonly (readonly GridPoint[])[])[]): Boundary {
  const coordinates = parts.map((rings) => rings.map((ring) => closeRing(ring.map(fromGridPoint))))
  return coordinates.length === 1 ? { type: 'Polygon', coordinates: coordinates[0] ?? [] } : { type: 'MultiPolygon', coordinates }
}

/** A ring that ends where it starts. */
export function closeRing(corners: readonly Position[]): Ring {
  return [...corners, ...corners.slice(0, 1)].map(([lon, lat]): Position => [lon, lat])
}
