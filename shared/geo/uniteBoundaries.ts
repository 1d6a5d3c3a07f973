import { featureCollection, polygon, pointOnFeature, booleanPointInPolygon, union } from '@turf/turf'
import { checkBoundary, type BoundaryCheck } from './checkBoundary.ts'
import { areTooFine } from './edgeMeetings.ts'
import { offsetFromEdge } from './edgeOffset.ts'
import type { Boundary } from './geometryTypes.ts'
import { closeRing, fromGridParts, fromGridPoint, toGridParts, type GridPoint } from './gridPoints.ts'
import { takeCorners } from './jointCorners.ts'
import { measurePolygon } from './measurePolygon.ts'

/** Outlines that come this near, metres, are drawn as touching: two units of the coordinates kept. */
const TOUCH_M = 0.025
/** A corner that a split set on an edge lies within a grid unit of it; beside another that does, within two. */
const BESIDE_UNITS = 2.05
/** Dropping corners may change the area by no more than this share. */
const MOST_CHANGE = 1e-6

export interface United extends BoundaryCheck {
  /** Whether some of them lie apart from the rest, touching nowhere or in a corner only. */
  isApart: boolean
}

/**
 * The ground of several valid boundaries as one: a Polygon where all of it hangs together, else a MultiPolygon. Edges that run along
 * each other within 2.5 cm are joined without a gap, and a corner is dropped where it stood only because the outlines met there, on
 * a line as straight as the coordinates allow; so a split is undone to the corner. Never throws.
 *
 * Codes besides those of `checkBoundary`: `geometry.too_fine` where outlines are laced too finely to be united in good time.
 * @param boundaries at least one, as `checkBoundary` lets them stand.
 */
export function uniteBoundaries(boundaries: readonly Boundary[]): United {
  if (isTooFine(boundaries)) return { geometry: null, findings: [{ code: 'geometry.too_fine', params: {} }], isApart: false }
  const inputs = boundaries.map(toGridParts)
  const exact = uniteInputs(inputs)
  // What shares its corners to the last digit is not touched; gaps and slivers of a hand's drawing leave spikes, or parts apart.
  return exact.geometry !== null && !exact.isApart ? exact : uniteInputs(joinCorners(inputs))
}

function uniteInputs(inputs: readonly Parts[]): United {
  const united = uniteParts(inputs)
  const joints = jointsOf(inputs)
  const cleaned = united.map((rings) => rings.map((ring) => dropJoints(ring, joints)).filter((ring) => ring.length > 2))
  const [whole, clean] = [checkBoundary(fromGridParts(united)), checkBoundary(fromGridParts(cleaned))]
  return { ...(isSameGround(whole.geometry, clean.geometry) ? clean : whole), isApart: areApart(inputs, united) }
}

function isSameGround(whole: Boundary | null, clean: Boundary | null): boolean {
  if (whole === null || clean === null) return clean !== null
  return Math.abs(measurePolygon(clean).areaM2 / measurePolygon(whole).areaM2 - 1) <= MOST_CHANGE
}

function isTooFine(boundaries: readonly Boundary[]): boolean {
  return boundaries.some((one, index) => boundaries.slice(0, index).some((other) => areTooFine(one, other)))
}

type Parts = GridPoint[][][]
const cornersOf = (parts: Parts): GridPoint[] => parts.flat(2)

/** Each outline with the corners of the others where they touch: first moved onto them, then set into its edges. */
function joinCorners(inputs: readonly Parts[]): Parts[] {
  const take = (parts: Parts, others: readonly Parts[]): Parts => {
    const theirs = others.flatMap((each) => each.flat())
    return parts.map((rings) => rings.map((ring) => takeCorners(ring, theirs, TOUCH_M)).filter((ring) => ring.length > 2))
  }
  const moved: Parts[] = []
  for (const parts of inputs) moved.push(take(parts, moved))
  return moved.map((parts, index) => take(parts, moved.filter((_, other) => other !== index)))
}

/** The union in whole grid units, where shared edges are exactly the same. */
function uniteParts(inputs: readonly Parts[]): Parts {
  const polygons = inputs.flatMap((parts) => parts.map((rings) => polygon(rings.map((ring) => [...ring, ...ring.slice(0, 1)].map(([x, y]) => [x, y])))))
  const [only] = polygons
  if (only === undefined) return []
  const shape = polygons.length === 1 ? only.geometry : union(featureCollection(polygons))?.geometry
  if (shape === undefined) return []
  const coordinates = shape.type === 'Polygon' ? [shape.coordinates] : shape.coordinates
  return coordinates.map((rings) => rings.map((ring) => ring.slice(0, -1).map(([x = 0, y = 0]): GridPoint => [Math.round(x), Math.round(y)])))
}

const keyOf = ([x, y]: GridPoint): string => `${x} ${y}`

/** Corners that belong to more than one outline. */
function jointsOf(inputs: readonly Parts[]): ReadonlySet<string> {
  const seen = new Map<string, number>()
  for (const parts of inputs) for (const key of new Set(cornersOf(parts).map(keyOf))) seen.set(key, (seen.get(key) ?? 0) + 1)
  return new Set([...seen].filter(([, count]) => count > 1).map(([key]) => key))
}

/** Corners that a split may have set beside its own on an edge, to either side. */
const MOST_BESIDE = 2

/**
 * A ring without the corners at joints, and those next to them, that lie within the grid units of the edge from the corner before to
 * the corner after that a split sets its corners in (see `setCorners`).
 */
function dropJoints(ring: readonly GridPoint[], joints: ReadonlySet<string>): GridPoint[] {
  const at = (index: number): GridPoint => ring[(index + ring.length) % ring.length] ?? [0, 0]
  const dropped = new Set<number>()
  const spans = [...Array(MOST_BESIDE + 1).keys()].flatMap((before) => [...Array(MOST_BESIDE + 1).keys()].map((after) => [before + 1, after + 1] as const))
  const longestFirst = spans.sort(([a, b], [c, d]) => c + d - a - b)
  ring.forEach((corner, index) => {
    if (!joints.has(keyOf(corner)) || dropped.has(index)) return
    const span = longestFirst.find(([before, after]) => before + after < ring.length && isStraight(at, index - before, index + after))
    if (span === undefined) return
    for (let place = index - span[0] + 1; place < index + span[1]; place += 1) dropped.add((place + ring.length) % ring.length)
  })
  return ring.filter((_, index) => !dropped.has(index))
}

/** Whether all corners between two of a ring lie on the edge from one to the other, in order, as near as the grid allows. */
function isStraight(at: (index: number) => GridPoint, from: number, to: number): boolean {
  const [a, b] = [at(from), at(to)]
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  let reached = 0
  for (let index = from + 1; index < to; index += 1) {
    const corner = at(index)
    const along = ((corner[0] - a[0]) * dx + (corner[1] - a[1]) * dy) / (dx * dx + dy * dy || 1)
    if (along <= reached || along >= 1 || Math.abs(offsetFromEdge(a, b, corner)) > BESIDE_UNITS) return false
    reached = along
  }
  return true
}

/** Whether the parts of the union hang together through none of the outlines. */
function areApart(inputs: readonly Parts[], united: Parts): boolean {
  const groups = united.map((_, index) => index)
  for (const parts of inputs) {
    const homes = new Set(parts.map((rings) => groups[homeOf(rings, united)] ?? 0))
    const [first = 0] = homes
    groups.forEach((group, index) => { if (homes.has(group)) groups[index] = first })
  }
  return new Set(groups).size > 1
}

/** The part of the union that a polygon went into. */
function homeOf(rings: GridPoint[][], united: Parts): number {
  const toTurf = (each: GridPoint[][]) => polygon(each.map((ring) => closeRing(ring.map(fromGridPoint))))
  const inner = pointOnFeature(toTurf(rings))
  return Math.max(0, united.findIndex((each) => booleanPointInPolygon(inner, toTurf(each))))
}
