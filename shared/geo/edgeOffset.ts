import { fromGridPoint, type GridPoint } from './gridPoints.ts'
import { GRID_PER_DEGREE } from './gridRing.ts'
import { greatCircle } from './greatCircle.ts'
import { gridScaleAt } from './localPlane.ts'

/**
 * How far a point lies off the edge from a to b as it is measured (along the great circle, not the straight line of the drawing),
 * in grid units of the axis across the edge; above 0 to the left of a→b. For points beside the edge, between its ends.
 */
export function offsetFromEdge(a: GridPoint, b: GridPoint, point: GridPoint): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const isFlat = Math.abs(dx) >= Math.abs(dy)
  const along = isFlat ? (point[0] - a[0]) / dx : (point[1] - a[1]) / dy
  const circle = greatCircle(fromGridPoint(a), fromGridPoint(b))
  // At the same fraction of the angle the circle's own place along differs by far less than a unit.
  const [lon, lat] = circle.at(along)
  const [x, y] = [lon * GRID_PER_DEGREE, lat * GRID_PER_DEGREE]
  // The way along the edge from that place to the point is straight over so short a piece.
  if (isFlat) return (point[1] - y - ((point[0] - x) * dy) / dx) * Math.sign(dx)
  return -(point[0] - x - ((point[1] - y) * dx) / dy) * Math.sign(dy)
}

/** What the ground right of the edge a→b gains, square metres, when a corner is set on it at a point beside it. */
export function edgeChangeM2(a: GridPoint, b: GridPoint, point: GridPoint): number {
  const scale = gridScaleAt(a)
  const length = Math.max(Math.abs(b[0] - a[0]), Math.abs(b[1] - a[1]))
  return (offsetFromEdge(a, b, point) * length * scale.east * scale.north) / 2
}
