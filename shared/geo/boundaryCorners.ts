import { boundaryParts } from './boundaryParts.ts'
import type { Boundary, Position, Ring } from './geometryTypes.ts'
import { closeRing } from './gridPoints.ts'
import { movePosition } from './movePosition.ts'

/** One corner of a boundary: its part, the ring there (0 the outer one), and its number in the ring, all from 0. */
export interface CornerAt { part: number; ring: number; corner: number }

/** The corners of a ring, the last position, which repeats the first, left out. */
export const cornersOfRing = (ring: Ring): Position[] => ring.slice(0, -1).map(([lon, lat]): Position => [lon, lat])

/** The position of a corner; undefined where there is none. */
export function cornerOf(boundary: Boundary, { part, ring, corner }: CornerAt): Position | undefined {
  const found = boundaryParts(boundary)[part]?.[ring]
  return found === undefined || corner >= found.length - 1 ? undefined : found[corner]
}

/** The boundary with one corner elsewhere. It is not judged: `checkBoundary` does that. */
export function moveCorner(boundary: Boundary, at: CornerAt, to: Position): Boundary {
  return changeRing(boundary, at, (corners) => corners.with(at.corner, to))
}

/** The boundary with a new corner after one of its corners. */
export function insertCorner(boundary: Boundary, after: CornerAt, position: Position): Boundary {
  return changeRing(boundary, after, (corners) => corners.toSpliced(after.corner + 1, 0, position))
}

/**
 * The boundary without a corner. A hole or a part of three corners goes with it, and the holes of such a part;
 * null where nothing would be left.
 */
export function removeCorner(boundary: Boundary, at: CornerAt): Boundary | null {
  const parts = boundaryParts(boundary)
  const rings = parts[at.part] ?? []
  if ((rings[at.ring]?.length ?? 0) > 4) return changeRing(boundary, at, (corners) => corners.toSpliced(at.corner, 1))
  if (at.ring > 0) return fromParts(parts.with(at.part, rings.toSpliced(at.ring, 1)))
  return parts.length > 1 ? fromParts(parts.toSpliced(at.part, 1)) : null
}

/** The boundary moved as it is by metres east and north; each corner by its own radii, so shape and area stay within a few ppm. */
export function moveWhole(boundary: Boundary, eastM: number, northM: number): Boundary {
  return fromParts(boundaryParts(boundary).map((rings) => rings.map((ring) => ring.map((corner) => movePosition(corner, eastM, northM)))))
}

/** Parts as a boundary: a Polygon where there is one. */
export function fromParts(parts: readonly Ring[][]): Boundary {
  const [only] = parts
  return parts.length === 1 && only !== undefined ? { type: 'Polygon', coordinates: only } : { type: 'MultiPolygon', coordinates: [...parts] }
}

function changeRing(boundary: Boundary, { part, ring }: CornerAt, change: (corners: Position[]) => Position[]): Boundary {
  const parts = boundaryParts(boundary)
  return fromParts(parts.map((rings, index) =>
    index === part ? rings.map((each, number) => (number === ring ? closeRing(change(cornersOfRing(each))) : each)) : rings,
  ))
}
