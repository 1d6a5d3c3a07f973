import { boundaryParts } from './boundaryParts.ts'
import { fromParts } from './boundaryCorners.ts'
import { checkBoundary, type BoundaryCheck } from './checkBoundary.ts'
import type { Boundary, Position } from './geometryTypes.ts'
import { closeRing, toFlatRing, toGridPoint } from './gridPoints.ts'
import { relateRings } from './relateRings.ts'

/**
 * A valid boundary with a hole in the part that the corners lie in: a pond or a yard that is no ground of the block. Never throws.
 * @param corners of the hole in order, the first not repeated.
 * @returns as `checkBoundary` does: `geometry.hole_outside` where the hole lies across the outline or outside, `geometry.holes_overlap`
 * where it runs into another hole, `geometry.too_few_points` under three corners.
 */
export function cutHole(boundary: Boundary, corners: readonly Position[]): BoundaryCheck {
  if (corners.length < 3) return { geometry: null, findings: [{ code: 'geometry.too_few_points', params: { points: corners.length, min: 3 } }] }
  const parts = boundaryParts(boundary)
  const hole = toFlatRing(corners.map(toGridPoint))
  const home = parts.findIndex(([outer]) => outer !== undefined && relateRings(hole, toFlatRing(outer.slice(0, -1).map(toGridPoint))) === 'within')
  const into = Math.max(0, home)
  return checkBoundary(fromParts(parts.map((rings, part) => (part === into ? [...rings, closeRing(corners)] : rings))))
}
