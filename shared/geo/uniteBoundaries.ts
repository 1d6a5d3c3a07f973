import { featureCollection, polygon, pointOnFeature, booleanPointInPolygon, union } from '@turf/turf'
import { checkBoundary, type BoundaryCheck } from './checkBoundary.ts'
import { areTooFine } from './edgeMeetings.ts'
import { offsetFromEdge } from './edgeOffset.ts'
import type { Boundary } from './geometryTypes.ts'
import { closeRing, fromGridParts, fromGridPoint, toGridParts, type GridPoint } from './gridPoints.ts'
import { nearestOf, takeCorners } from './jointCorners.ts'
import { gridDistanceM, gridScaleAt } from './localPlane.ts'
import { measurePolygon } from './measurePolygon.ts'

/** Outlines that come this near, metres, are drawn as touching: two units of the coordinates kept. */
const TOUCH_M = 0.025
/** A corner that `setCorners` set on an edge lies within a grid unit of it. */
const ON_EDGE_UNITS = 1.02
/** Where it set two, they stand this near, metres. */
const BESIDE_M = 0.15
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
    const corners = others.flatMap(cornersOf)
    return parts.map((rings) => rings.map((ring) => takeCorners(ring, corners, TOUCH_M)).filter((ring) => ring.length > 2))
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
function jointsOf(inputs: readonly Parts[]): GridPoint[] {
  const seen = new Map<string, { corner: GridPoint; count: number }>()
  for (const parts of inputs) {
    for (const [key, corner] of new Map(cornersOf(parts).map((each) => [keyOf(each), each]))) {
      seen.set(key, { corner, count: (seen.get(key)?.count ?? 0) + 1 })
    }
  }
  return [...seen.values()].filter(({ count }) => count > 1).map(({ corner }) => corner)
}

/**
 * A ring without the corners at joints that lie on the line between the corners around them: within the grid unit that a corner set
 * on an edge may be off, or within two where two stand side by side.
 */
function dropJoints(ring: readonly GridPoint[], joints: readonly GridPoint[]): GridPoint[] {
  const atJoint = ring.map((corner) => nearestOf(corner, joints, BESIDE_M) !== undefined)
  const scale = gridScaleAt(ring[0] ?? [0, 0])
  /** The nearest corner before or after that does not stand beside this one, and how many stand between. */
  const beyond = (from: number, step: 1 | -1): { corner: GridPoint; beside: number } => {
    const corner = ring[from] ?? [0, 0]
    for (let gone = 1; gone < ring.length; gone += 1) {
      const other = ring[(from + gone * step + ring.length * gone) % ring.length] ?? corner
      if (gridDistanceM(corner, other, scale) > BESIDE_M) return { corner: other, beside: gone - 1 }
    }
    return { corner, beside: 0 }
  }
  return ring.filter((corner, index) => {
    const [before, after] = [beyond(index, -1), beyond(index, 1)]
    const off = before.beside + after.beside > 0 ? 2 * ON_EDGE_UNITS : ON_EDGE_UNITS
    return !atJoint[index] || !isOnLine(before.corner, corner, after.corner, off)
  })
}

function isOnLine(before: GridPoint, corner: GridPoint, after: GridPoint, offUnits: number): boolean {
  const [dx, dy] = [after[0] - before[0], after[1] - before[1]]
  const isBetween = (corner[0] - before[0]) * dx + (corner[1] - before[1]) * dy > 0 && (after[0] - corner[0]) * dx + (after[1] - corner[1]) * dy > 0
  return isBetween && Math.abs(offsetFromEdge(before, after, corner)) <= offUnits
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
