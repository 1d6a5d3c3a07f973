import { checkBoundary } from './checkBoundary.ts'
import { setCorners, type EdgeToCut, type NewCorner } from './cornersOnEdges.ts'
import type { Boundary, GeometryFinding, Position } from './geometryTypes.ts'
import { fromGridParts, isSamePoint, toGridParts, toGridPoint, type GridPoint } from './gridPoints.ts'
import { crossesProperly } from './gridSegments.ts'
import { measurePolygon } from './measurePolygon.ts'
import { middleOf } from './middleOf.ts'
import { findStretches, isInside, type Meeting, type Stretch } from './splitMeetings.ts'
import { traceFaces } from './traceFaces.ts'

export interface SplitResult {
  /** The pieces from west to east, each one polygon; empty where anything was found. */
  pieces: Boundary[]
  findings: GeometryFinding[]
}

/** Pieces differ in sum from the whole by no more than this share. */
export const MOST_SPLIT_ERROR = 1e-6

/**
 * A valid boundary cut along a line, or along several crossings of one line. Every piece of ground that then hangs together is a
 * piece; parts that the line does not meet are pieces as they are, and a stretch that ends in a hole without going on cuts nothing.
 * Where the line passes within 0.3 m of a corner it goes through it. The pieces sum to the whole within 1 ppm. Never throws.
 *
 * Codes: `split.too_short` (under two points), `split.crosses_itself`, `split.ends_inside` {end: 1 or 2}, `split.misses` (it crosses
 * nothing that could be separated), `split.not_possible` (a piece would be no boundary, or the sum would not hold).
 * @param boundary as `checkBoundary` lets it stand. @param line positions in degrees, first and last outside of it or on its edge.
 */
export function splitBoundary(boundary: Boundary, line: readonly Position[]): SplitResult {
  const points = line.map(toGridPoint).filter((point, index, all) => index === 0 || !isSamePoint(point, all[index - 1] ?? [NaN, NaN]))
  const parts = toGridParts(boundary)
  const fault = lineFault(parts, points)
  if (fault !== null) return { pieces: [], findings: [fault] }
  const wholeM2 = measurePolygon(boundary).areaM2
  const toleranceM2 = (wholeM2 * MOST_SPLIT_ERROR * SHARE_OF_ERROR) / parts.length
  const split = parts.map((rings) => splitPart(rings, findStretches(rings, points), toleranceM2))
  if (split.every((faces) => faces.length < 2)) return refuse('split.misses')
  return checkPieces(split.flat(), wholeM2)
}

const refuse = (code: string): SplitResult => ({ pieces: [], findings: [{ code, params: {} }] })

function lineFault(parts: readonly GridPoint[][][], points: readonly GridPoint[]): GeometryFinding | null {
  const [first, last] = [points[0], points.at(-1)]
  if (first === undefined || last === undefined || points.length < 2) return { code: 'split.too_short', params: {} }
  const segments = points.slice(1).map(([bx, by], index) => ({ ax: points[index]?.[0] ?? bx, ay: points[index]?.[1] ?? by, bx, by }))
  if (segments.some((one, index) => segments.slice(0, index).some((other) => crossesProperly(one, other)))) return { code: 'split.crosses_itself', params: {} }
  const within = [first, last].findIndex((end) => parts.some((rings) => isInside(rings, end)))
  return within === -1 ? null : { code: 'split.ends_inside', params: { end: within + 1 } }
}

/** Less than all that may be off: the corners of one edge are set one after another. */
const SHARE_OF_ERROR = 0.4

function splitPart(rings: GridPoint[][], stretches: readonly Stretch[], toleranceM2: number): GridPoint[][][] {
  if (stretches.length === 0) return [rings]
  const onEdges = [...new Set(stretches.flatMap(({ from, to }) => [from, to]))].filter(({ isCorner }) => !isCorner).sort(inOrder(rings))
  const corners = placeCorners(rings, onEdges, toleranceM2)
  const cut = rings.map((ring, number) => ring.flatMap((corner, edge) => [
    corner, ...onEdges.filter((meeting) => meeting.ring === number && meeting.edge === edge).flatMap((meeting) => allOf(corners.get(meeting))),
  ]))
  const pointOf = (meeting: Meeting): GridPoint => corners.get(meeting)?.at ?? meeting.near
  return traceFaces(cut, stretches.map(({ from, to, between }) => [pointOf(from), ...between, pointOf(to)]))
}

const allOf = (corner: NewCorner | undefined): GridPoint[] => (corner === undefined ? [] : [...corner.before, corner.at, ...corner.after])

const inOrder = (rings: GridPoint[][]) => (a: Meeting, b: Meeting): number => a.ring - b.ring || a.edge - b.edge || farFrom(rings, a) - farFrom(rings, b)

function farFrom(rings: GridPoint[][], { ring, edge, near }: Meeting): number {
  const [x, y] = rings[ring]?.[edge] ?? near
  return Math.hypot(near[0] - x, near[1] - y)
}

/** Corners for the meetings on edges. Of several on one edge each is set on what the one before has left of it. */
function placeCorners(rings: GridPoint[][], meetings: readonly Meeting[], toleranceM2: number): Map<Meeting, NewCorner> {
  const placed = new Map<Meeting, NewCorner>()
  const isOnSame = (one: Meeting | undefined, other: Meeting): boolean => one?.ring === other.ring && one.edge === other.edge
  const edgeOf = (meeting: Meeting, index: number): EdgeToCut => {
    const { ring, edge, near } = meeting
    const before = meetings[index - 1]
    const corners = rings[ring] ?? []
    const a = isOnSame(before, meeting) && before !== undefined ? placed.get(before)?.at : corners[edge]
    return { a: a ?? near, b: corners[(edge + 1) % corners.length] ?? near, near, more: isOnSame(meetings[index + 1], meeting) }
  }
  const first = meetings.filter((meeting, index) => !isOnSame(meetings[index - 1], meeting))
  const corners = setCorners(first.map((meeting) => edgeOf(meeting, meetings.indexOf(meeting))), toleranceM2)
  first.forEach((meeting, index) => { const corner = corners[index]; if (corner !== undefined) placed.set(meeting, corner) })
  meetings.forEach((meeting, index) => {
    if (placed.has(meeting)) return
    const [corner] = setCorners([edgeOf(meeting, index)], toleranceM2)
    if (corner !== undefined) placed.set(meeting, corner)
  })
  return placed
}

function checkPieces(faces: readonly GridPoint[][][], wholeM2: number): SplitResult {
  const pieces = faces.map((rings) => checkBoundary(fromGridParts([rings])).geometry)
  const whole = pieces.filter((piece) => piece !== null)
  const sumM2 = whole.reduce((sum, piece) => sum + measurePolygon(piece).areaM2, 0)
  if (whole.length < pieces.length || Math.abs(sumM2 / wholeM2 - 1) > MOST_SPLIT_ERROR) return refuse('split.not_possible')
  return { pieces: whole.sort((a, b) => middleOf(a)[0] - middleOf(b)[0] || middleOf(b)[1] - middleOf(a)[1]), findings: [] }
}
