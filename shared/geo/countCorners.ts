import { boundaryParts } from './boundaryParts.ts'
import type { Boundary } from './geometryTypes.ts'

/** Corners of every ring of a boundary, holes too; the last position of a ring repeats its first and is not counted. */
export function countCorners(geometry: Boundary): number {
  return boundaryParts(geometry).flat().reduce((sum, ring) => sum + ring.length - 1, 0)
}
