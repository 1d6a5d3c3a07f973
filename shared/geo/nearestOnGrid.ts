import { edgeChangeM2, offsetFromEdge } from './edgeOffset.ts'
import type { GridPoint } from './gridPoints.ts'

/** Grid units to either side that a corner may move along its edge: about a decimetre. */
const REACH = 10

/** A grid point beside an edge, and what the ground changes when a corner is set on the edge there, square metres. */
export interface GridPlace { at: GridPoint; areaM2: number }

/**
 * Grid points beside the edge from a to b near a place on it, within about a decimetre along the edge and a grid unit across, nearest
 * first; the place itself, rounded, where the edge is too short for any.
 */
export function placesOnGrid(a: GridPoint, b: GridPoint, near: GridPoint): GridPlace[] {
  const isFlat = Math.abs(b[0] - a[0]) >= Math.abs(b[1] - a[1])
  const [start, end, middle] = isFlat ? [a[0], b[0], near[0]] : [a[1], b[1], near[1]]
  const places: GridPlace[] = []
  for (let step = 0; step <= 2 * REACH; step += 1) {
    const along = Math.round(middle) + (step % 2 === 0 ? step / 2 : -(step + 1) / 2)
    if (along <= Math.min(start, end) || along >= Math.max(start, end)) continue
    for (const at of rowsAt(a, b, along, isFlat)) places.push({ at, areaM2: edgeChangeM2(a, b, at) })
  }
  return places.length > 0 ? places : [{ at: [Math.round(near[0]), Math.round(near[1])], areaM2: 0 }]
}

/** The place that leaves the least beside what is there already; of equals the nearest. @param enoughM2 less than this is no better. */
export function bestPlace(places: readonly GridPlace[], restM2: number, enoughM2 = 0): GridPlace {
  const left = ({ areaM2 }: GridPlace): number => Math.max(Math.abs(restM2 + areaM2), enoughM2)
  return places.reduce((least, each) => (left(each) < left(least) ? each : least))
}

/** The grid point within a decimetre of a place on an edge that lies closest to the edge itself. */
export const nearestOnGrid = (a: GridPoint, b: GridPoint, near: GridPoint): GridPoint => bestPlace(placesOnGrid(a, b, near), 0).at

/** The two grid points on either side of the edge at a place along it. */
function rowsAt(a: GridPoint, b: GridPoint, along: number, isFlat: boolean): GridPoint[] {
  const share = isFlat ? (along - a[0]) / (b[0] - a[0]) : (along - a[1]) / (b[1] - a[1])
  const row = Math.round(isFlat ? a[1] + share * (b[1] - a[1]) : a[0] + share * (b[0] - a[0]))
  const guess: GridPoint = isFlat ? [along, row] : [row, along]
  const off = offsetFromEdge(a, b, guess) * (isFlat ? Math.sign(b[0] - a[0]) : -Math.sign(b[1] - a[1]))
  const exact = row - off
  return [Math.floor(exact), Math.ceil(exact)].map((across): GridPoint => (isFlat ? [along, across] : [across, along]))
}
