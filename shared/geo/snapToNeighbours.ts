import { boundaryParts } from './boundaryParts.ts'
import { checkBoundary, type BoundaryCheck } from './checkBoundary.ts'
import { offsetFromEdge } from './edgeOffset.ts'
import type { Boundary } from './geometryTypes.ts'
import { fromGridParts, fromGridPoint, isSamePoint, toGridParts, toGridPoint, type GridPoint } from './gridPoints.ts'
import { nearestOf, takeCorners, withoutReturns } from './jointCorners.ts'
import { gridScaleAt, placeAlong } from './localPlane.ts'
import { nearestOnGrid } from './nearestOnGrid.ts'

export interface Snapped extends BoundaryCheck {
  /** Corners that moved or came in. */
  changed: number
}

/**
 * A valid boundary drawn onto its neighbours: a corner within a tolerance of a neighbour's corner takes that corner; one within it of
 * a neighbour's edge goes onto the edge, as near as coordinates of 1e-7 degrees allow; and where a neighbour's corner lies within it of
 * an edge, the edge gets that corner. So a common border has the same corners on both sides and leaves neither gap nor overlap.
 * Corners of its own between them on one and the same edge of a neighbour are dropped. Never throws.
 * @param neighbours valid boundaries. @param toleranceM metres, above 0.
 * @returns as `checkBoundary` does; where the snapped outline could not stand, null and what was found.
 */
export function snapToNeighbours(boundary: Boundary, neighbours: readonly Boundary[], toleranceM: number): Snapped {
  const rings = neighbours.filter((neighbour) => isNear(boundary, neighbour, toleranceM)).flatMap((neighbour) => toGridParts(neighbour).flat())
  const before = toGridParts(boundary)
  if (rings.length === 0) return { geometry: boundary, findings: [], changed: 0 }
  const after = before.map((part) => part.map((ring) => snapRing(ring, rings, toleranceM)))
  return { ...checkBoundary(fromGridParts(after)), changed: countChanged(before, after) }
}

function snapRing(ring: readonly GridPoint[], neighbours: readonly GridPoint[][], toleranceM: number): GridPoint[] {
  const corners = neighbours.flat()
  const onto = ring.map((corner) => nearestOf(corner, corners, toleranceM) ?? ontoEdge(corner, neighbours, toleranceM) ?? corner)
  const joined = takeCorners(withoutReturns(onto), neighbours, toleranceM)
  return withoutReturns(dropBetween(joined, corners, neighbours))
}

/** The place on the nearest edge within reach; undefined where there is none. */
function ontoEdge(corner: GridPoint, neighbours: readonly GridPoint[][], toleranceM: number): GridPoint | undefined {
  const scale = gridScaleAt(corner)
  let best: GridPoint | undefined
  let least = toleranceM
  for (const [a, b] of edgesOf(neighbours)) {
    const { along, offM } = placeAlong(a, b, corner, scale)
    if (offM > least || along === 0 || along === 1) continue
    best = nearestOnGrid(a, b, [a[0] + along * (b[0] - a[0]), a[1] + along * (b[1] - a[1])])
    least = offM
  }
  return best
}

function edgesOf(rings: readonly GridPoint[][]): (readonly [GridPoint, GridPoint])[] {
  return rings.flatMap((ring) => ring.map((a, index) => [a, ring[(index + 1) % ring.length] ?? a] as const))
}

/** Without the corners that lie on a neighbour's edge between two others that lie on it too: the edge itself is enough there. */
function dropBetween(ring: readonly GridPoint[], corners: readonly GridPoint[], neighbours: readonly GridPoint[][]): GridPoint[] {
  const edges = edgesOf(neighbours)
  const isTheirs = (corner: GridPoint): boolean => corners.some((each) => isSamePoint(each, corner))
  return ring.filter((corner, index) => {
    const around = [ring[(index + ring.length - 1) % ring.length] ?? corner, corner, ring[(index + 1) % ring.length] ?? corner]
    return isTheirs(corner) || !edges.some(([a, b]) => around.every((each) => isOn(a, b, each)))
  })
}

function isOn(a: GridPoint, b: GridPoint, point: GridPoint): boolean {
  if (isSamePoint(a, point) || isSamePoint(b, point)) return true
  const { along, offM } = placeAlong(a, b, point, gridScaleAt(a))
  return along > 0 && along < 1 && offM < 1 && Math.abs(offsetFromEdge(a, b, point)) <= 1
}

function isNear(a: Boundary, b: Boundary, reachM: number): boolean {
  const [boxA, boxB] = [boxOf(a), boxOf(b)]
  const scale = gridScaleAt([boxA.west, boxA.south])
  const [x, y] = [reachM / scale.east, reachM / scale.north]
  return boxA.west <= boxB.east + x && boxB.west <= boxA.east + x && boxA.south <= boxB.north + y && boxB.south <= boxA.north + y
}

function boxOf(boundary: Boundary): { west: number; south: number; east: number; north: number } {
  const box = { west: Infinity, south: Infinity, east: -Infinity, north: -Infinity }
  for (const [x, y] of boundaryParts(boundary).flat(2).map(toGridPoint)) {
    box.west = Math.min(box.west, x)
    box.east = Math.max(box.east, x)
    box.south = Math.min(box.south, y)
    box.north = Math.max(box.north, y)
  }
  return box
}

function countChanged(before: readonly GridPoint[][][], after: readonly GridPoint[][][]): number {
  const keys = new Set(before.flat(2).map((corner) => fromGridPoint(corner).join(' ')))
  return after.flat(2).filter((corner) => !keys.has(fromGridPoint(corner).join(' '))).length
}
