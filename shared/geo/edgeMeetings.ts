import { boundaryParts } from './boundaryParts.ts'
import type { Boundary } from './geometryTypes.ts'

/** Two outlines whose edges meet more often than this are not clipped: the work grows with the square of it. */
export const MOST_MEETINGS = 10_000

type EdgeBox = readonly [west: number, south: number, east: number, north: number]

/**
 * Whether two boundaries are too finely laced to be clipped against each other in good time: their edges' boxes meet more
 * than `MOST_MEETINGS` times. Outlines of land meet a few hundred times at most.
 */
export function areTooFine(a: Boundary, b: Boundary): boolean {
  const others = edgeBoxes(b)
  let meetings = 0
  for (const [west, south, east, north] of edgeBoxes(a)) {
    for (const other of others) {
      if (west <= other[2] && other[0] <= east && south <= other[3] && other[1] <= north) meetings += 1
    }
    if (meetings > MOST_MEETINGS) return true
  }
  return false
}

function edgeBoxes(boundary: Boundary): EdgeBox[] {
  return boundaryParts(boundary).flatMap((rings) => rings).flatMap((ring) =>
    ring.slice(1).map(([lon, lat], index): EdgeBox => {
      const [fromLon, fromLat] = ring[index] ?? [lon, lat]
      return [Math.min(lon, fromLon), Math.min(lat, fromLat), Math.max(lon, fromLon), Math.max(lat, fromLat)]
    }),
  )
}
