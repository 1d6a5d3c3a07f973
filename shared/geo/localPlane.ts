import { metresPerDegree } from './ellipsoid.ts'
import { GRID_PER_DEGREE } from './gridRing.ts'
import type { GridPoint } from './gridPoints.ts'

/** Metres a grid unit is wide and high about a latitude. */
export interface GridScale { east: number; north: number }

/** What a grid unit of 1e-7 degrees measures about a point: good for lengths within a farm. */
export function gridScaleAt([, y]: GridPoint): GridScale {
  const metres = metresPerDegree(y / GRID_PER_DEGREE)
  return { east: metres.east / GRID_PER_DEGREE, north: metres.north / GRID_PER_DEGREE }
}

/** Metres between two grid points of one farm. */
export function gridDistanceM(a: GridPoint, b: GridPoint, scale: GridScale): number {
  return Math.hypot((a[0] - b[0]) * scale.east, (a[1] - b[1]) * scale.north)
}

/** Where a point comes nearest to the segment a–b: its place along it (0 to 1) and how far off it is, metres. */
export function placeAlong(a: GridPoint, b: GridPoint, point: GridPoint, scale: GridScale): { along: number; offM: number } {
  const [dx, dy] = [(b[0] - a[0]) * scale.east, (b[1] - a[1]) * scale.north]
  const [px, py] = [(point[0] - a[0]) * scale.east, (point[1] - a[1]) * scale.north]
  const lengthSquared = dx * dx + dy * dy
  const along = lengthSquared === 0 ? 0 : Math.min(1, Math.max(0, (px * dx + py * dy) / lengthSquared))
  return { along, offM: Math.hypot(px - along * dx, py - along * dy) }
}
