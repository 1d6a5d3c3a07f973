import { isSamePoint, type GridPoint } from './gridPoints.ts'
import { gridDistanceM, gridScaleAt, placeAlong } from './localPlane.ts'

/**
 * A ring whose corners lie on the others' corners where they come within a distance, and whose edges have a corner wherever one of
 * the others' comes that near: edges that run along each other then do so corner by corner. An edge that is one of theirs already, and
 * corners as near to an end of the edge, are left alone.
 * @param ring corners in order, the first not repeated. @param others rings of the others. @param nearM metres.
 */
export function takeCorners(ring: readonly GridPoint[], others: readonly (readonly GridPoint[])[], nearM: number): GridPoint[] {
  const scale = gridScaleAt(ring[0] ?? [0, 0])
  const corners = others.flat()
  const edges = edgeKeys(others)
  const moved = ring.map((corner) => nearestOf(corner, corners, nearM) ?? corner)
  const whole = moved.flatMap((from, index) => {
    const to = moved[(index + 1) % moved.length] ?? from
    if (edges.has(edgeKey(from, to))) return [from]
    const between = corners
      .filter((corner) => isInBox(from, to, corner, [nearM / scale.east, nearM / scale.north]))
      .map((corner) => ({ corner, ...placeAlong(from, to, corner, scale) }))
      .filter(({ corner, offM }) => offM <= nearM && gridDistanceM(corner, from, scale) > nearM && gridDistanceM(corner, to, scale) > nearM)
      .sort((a, b) => a.along - b.along)
    return [from, ...between.map(({ corner }) => corner)]
  })
  return withoutReturns(whole)
}

/** The same either way round. */
const edgeKey = (a: GridPoint, b: GridPoint): string => (a[0] < b[0] || (a[0] === b[0] && a[1] < b[1]) ? `${a.join(' ')} ${b.join(' ')}` : `${b.join(' ')} ${a.join(' ')}`)

function edgeKeys(rings: readonly (readonly GridPoint[])[]): ReadonlySet<string> {
  return new Set(rings.flatMap((ring) => ring.map((from, index) => edgeKey(from, ring[(index + 1) % ring.length] ?? from))))
}

function isInBox(a: GridPoint, b: GridPoint, [x, y]: GridPoint, [reachX, reachY]: readonly [number, number]): boolean {
  return (
    x >= Math.min(a[0], b[0]) - reachX && x <= Math.max(a[0], b[0]) + reachX &&
    y >= Math.min(a[1], b[1]) - reachY && y <= Math.max(a[1], b[1]) + reachY
  )
}

/** The nearest of some points, undefined where none is within a distance in metres. */
export function nearestOf(point: GridPoint, others: readonly GridPoint[], nearM: number): GridPoint | undefined {
  const scale = gridScaleAt(point)
  const reach = [nearM / scale.east, nearM / scale.north] as const
  let best: GridPoint | undefined
  let least = nearM
  for (const other of others) {
    if (Math.abs(other[0] - point[0]) > reach[0] || Math.abs(other[1] - point[1]) > reach[1]) continue
    const distance = gridDistanceM(point, other, scale)
    if (distance > least) continue
    best = other
    least = distance
  }
  return best
}

/** A ring without corners that repeat the one before, and without ways out and straight back to the same corner. */
export function withoutReturns(ring: readonly GridPoint[]): GridPoint[] {
  const kept: GridPoint[] = []
  for (const corner of ring) {
    const [before, last] = [kept.at(-2), kept.at(-1)]
    if (last !== undefined && isSamePoint(last, corner)) continue
    if (before !== undefined && isSamePoint(before, corner)) kept.pop()
    else kept.push(corner)
  }
  return trimSeam(kept)
}

/** The same where the ring closes. */
function trimSeam(ring: GridPoint[]): GridPoint[] {
  const [first, second, beforeLast, last] = [ring[0], ring[1], ring.at(-2), ring.at(-1)]
  if (ring.length < 3 || first === undefined || last === undefined || second === undefined || beforeLast === undefined) return ring
  if (isSamePoint(first, last)) return trimSeam(ring.slice(0, -1))
  if (isSamePoint(first, beforeLast)) return trimSeam(ring.slice(0, -2))
  return isSamePoint(second, last) ? trimSeam(ring.slice(1, -1)) : ring
}
