import { boundaryParts } from './boundaryParts.ts'
import { sharedM2 } from './findOverlaps.ts'
import { areTooFine } from './edgeMeetings.ts'
import { GRID_PER_DEGREE } from './gridRing.ts'
import type { Boundary, Position, Ring } from './geometryTypes.ts'
import { measurePolygon } from './measurePolygon.ts'

/** What the parts may differ from the whole by, and what two of them may share. */
const MOST_SHARE = 1e-6
/** A part may lie beyond the outline by slivers of this width, metres: less than any outline is drawn to. */
const SLIVER_M = 0.05
/** A corner this near an edge, in grid units of about a centimetre, was set on it: edges are great circles, the grid is not. */
const NEAR_UNITS = 4

/** What is wrong with one part, or with all of them together (`part` null). */
export interface SplitFault {
  part: number | null
  code: 'split.outside' | 'split.overlap' | 'split.sum' | 'split.too_fine'
  params: Record<string, number>
}

/**
 * Whether valid boundaries cut a valid whole into parts: each in it, none over another, and together all of it within 1 ppm.
 * The corners where a cut meets the outline lie on the grid of 1e-7 degrees and so beside the edge; the whole counts as drawn, or
 * with those corners in its edges, so that a grid step is not counted as land lost or won.
 */
export function findSplitFaults(whole: Boundary, parts: readonly Boundary[]): SplitFault[] {
  const cut = withCorners(whole, parts.flatMap(listCorners))
  const wholeM2 = measurePolygon(whole).areaM2
  const mostM2 = wholeM2 * MOST_SHARE
  if (parts.some((part, index) => areTooFine(part, cut) || parts.slice(index + 1).some((other) => areTooFine(part, other)))) {
    return [{ part: null, code: 'split.too_fine', params: {} }]
  }
  const measures = parts.map(measurePolygon)
  const faults: SplitFault[] = parts.flatMap((part, index): SplitFault[] => {
    const { areaM2 = 0, perimeterM = 0 } = measures[index] ?? {}
    const outsideM2 = areaM2 - sharedM2(part, cut)
    return [
      ...(outsideM2 > mostM2 && outsideM2 > perimeterM * SLIVER_M ? [{ part: index, code: 'split.outside' as const, params: {} }] : []),
      ...parts.slice(0, index).flatMap((other, place) => (sharedM2(part, other) > mostM2 ? [{ part: index, code: 'split.overlap' as const, params: { part: place + 1 } }] : [])),
    ]
  })
  if (faults.length > 0) return faults
  const sumM2 = measures.reduce((sum, { areaM2 }) => sum + areaM2, 0)
  const missingM2 = [wholeM2 - sumM2, measurePolygon(cut).areaM2 - sumM2]
  return missingM2.every((missing) => Math.abs(missing) > mostM2) ? [{ part: null, code: 'split.sum', params: { areaM2: Number((missingM2[0] ?? 0).toFixed(1)) } }] : []
}

function listCorners(geometry: Boundary): Position[] {
  return boundaryParts(geometry).flatMap((rings) => rings.flatMap((ring) => ring.slice(1)))
}

/** The boundary with those corners put into its edges that lie on them, within a grid step. */
function withCorners(whole: Boundary, corners: readonly Position[]): Boundary {
  const put = (ring: Ring) => ring.flatMap((from, index) => {
    const to = ring[index + 1]
    return to === undefined ? [from] : [from, ...onEdge(from, to, corners)]
  })
  return whole.type === 'Polygon'
    ? { type: 'Polygon', coordinates: whole.coordinates.map(put) }
    : { type: 'MultiPolygon', coordinates: whole.coordinates.map((rings) => rings.map(put)) }
}

/** Those corners that lie on an edge and are not its ends, in its order. */
function onEdge(from: Position, to: Position, corners: readonly Position[]): Position[] {
  const x = (to[0] - from[0]) * GRID_PER_DEGREE
  const y = (to[1] - from[1]) * GRID_PER_DEGREE
  const length = Math.hypot(x, y)
  const found = new Map<string, { along: number; corner: Position }>()
  for (const corner of corners) {
    const dx = (corner[0] - from[0]) * GRID_PER_DEGREE
    const dy = (corner[1] - from[1]) * GRID_PER_DEGREE
    const along = (dx * x + dy * y) / length
    const off = Math.abs(dx * y - dy * x) / length
    if (off <= NEAR_UNITS && along > 0.5 && along < length - 0.5) found.set(corner.join(), { along, corner })
  }
  return [...found.values()].sort((a, b) => a.along - b.along).map(({ corner }) => corner)
}
