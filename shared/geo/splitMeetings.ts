import { isSamePoint, toFlatRing, turnOf, type GridPoint } from './gridPoints.ts'
import { gridDistanceM, gridScaleAt } from './localPlane.ts'
import { placeOf } from './relateRings.ts'

/** Where a line meets a polygon: at a corner, or on an edge (both ends given) near a point. */
export interface Meeting {
  ring: number
  /** Number of the edge in its ring: it runs from that corner to the next. At a corner, that corner's own. */
  edge: number
  /** The wanted place, grid units, not yet on the grid unless it is a corner. */
  near: GridPoint
  isCorner: boolean
}

/** A stretch of the line inside the polygon, from one meeting to the next, with the line's own points between them. */
export interface Stretch { from: Meeting; to: Meeting; between: GridPoint[] }

/** Nearer than this to a corner, metres, the line goes through the corner. */
const AT_CORNER_M = 0.3

/**
 * The stretches of a line that lie inside a polygon, from meeting to meeting. A line that only touches has none.
 * @param rings corners not repeated, the outer ring first. @param line at least two points.
 */
export function findStretches(rings: readonly GridPoint[][], line: readonly GridPoint[]): Stretch[] {
  const met = line.slice(1).flatMap((to, index) => {
    const from = line[index] ?? to
    return meetingsOf(rings, from, to).map((meeting) => ({ meeting, segment: index, t: placeOn(from, to, meeting.near) }))
  })
  met.sort((a, b) => a.segment - b.segment || a.t - b.t)
  const distinct = met.filter(({ meeting }, index) => index === 0 || !isSameMeeting(met[index - 1]?.meeting, meeting))
  return distinct.slice(1).flatMap((next, index) => {
    const before = distinct[index]
    if (before === undefined) return []
    const stretch: Stretch = { from: before.meeting, to: next.meeting, between: line.slice(before.segment + 1, next.segment + 1) }
    stretch.between = stretch.between.filter((point) => !isSamePoint(point, stretch.from.near) && !isSamePoint(point, stretch.to.near))
    return isInside(rings, middleOfLongest(stretch)) ? [stretch] : []
  })
}

/** Whether a point lies within a polygon's ground, not on its rings. */
export function isInside(rings: readonly GridPoint[][], [x, y]: GridPoint): boolean {
  const places = rings.map((ring) => placeOf(toFlatRing(ring), x, y))
  return places[0] === 1 && places.slice(1).every((place) => place === -1)
}

function meetingsOf(rings: readonly GridPoint[][], from: GridPoint, to: GridPoint): Meeting[] {
  return rings.flatMap((ring, number) =>
    ring.flatMap((a, edge): Meeting[] => {
      const b = ring[(edge + 1) % ring.length] ?? a
      const near = crossingOf(from, to, a, b)
      if (near === null) return []
      const scale = gridScaleAt(a)
      if (gridDistanceM(near, a, scale) <= AT_CORNER_M) return [{ ring: number, edge, near: a, isCorner: true }]
      if (gridDistanceM(near, b, scale) <= AT_CORNER_M) return [{ ring: number, edge: (edge + 1) % ring.length, near: b, isCorner: true }]
      return [{ ring: number, edge, near, isCorner: false }]
    }),
  )
}

/** Where two segments cross or touch; null where they do not, or lie along each other. */
function crossingOf(from: GridPoint, to: GridPoint, a: GridPoint, b: GridPoint): GridPoint | null {
  const [sideA, sideB] = [turnOf(from, to, a), turnOf(from, to, b)]
  if (sideA * sideB > 0 || turnOf(a, b, from) * turnOf(a, b, to) > 0 || sideA === sideB) return null
  const share = sideA / (sideA - sideB)
  return [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])]
}

function placeOn(from: GridPoint, to: GridPoint, point: GridPoint): number {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  return ((point[0] - from[0]) * dx + (point[1] - from[1]) * dy) / (dx * dx + dy * dy || 1)
}

function isSameMeeting(a: Meeting | undefined, b: Meeting): boolean {
  if (a === undefined || a.ring !== b.ring || a.edge !== b.edge || a.isCorner !== b.isCorner) return false
  return a.isCorner || gridDistanceM(a.near, b.near, gridScaleAt(a.near)) <= AT_CORNER_M
}

function middleOfLongest({ from, to, between }: Stretch): GridPoint {
  const path = [from.near, ...between, to.near]
  let best: GridPoint = from.near
  let longest = -1
  for (let index = 1; index < path.length; index += 1) {
    const [a, b] = [path[index - 1] ?? from.near, path[index] ?? to.near]
    const length = Math.hypot(b[0] - a[0], b[1] - a[1])
    if (length <= longest) continue
    longest = length
    best = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2]
  }
  return best
}
