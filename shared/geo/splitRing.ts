import type { Position, Ring } from './geometryTypes.ts'
import { greatCircle } from './greatCircle.ts'

const STEP_M = 50
/** Short edges of a bed are cut too: uncut, a side of 40 m at 64° costs a part in a million. */
const MIN_PIECES = 4
/** An edge across half the globe is cut coarser rather than into a million pieces. */
const MAX_PIECES = 8_192
const MEAN_RADIUS_M = 6_371_000

/**
 * A ring with every edge cut into pieces of at most 50 m along the great circle, its longitudes counted on from the first point
 * (0 there) without a jump at ±180°.
 * @param ring closed, degrees.
 */
export function splitRing(ring: Ring): Ring {
  const first = ring[0]
  if (first === undefined) return []
  const dense: Ring = [[0, first[1]]]
  let lon = 0
  for (let index = 1; index < ring.length; index += 1) {
    const from = ring[index - 1]
    const to = ring[index]
    if (from === undefined || to === undefined) continue
    const deltaLon = wrap(to[0] - from[0])
    appendPieces(dense, [lon, from[1]], [lon + deltaLon, to[1]])
    lon += deltaLon
    dense.push([lon, to[1]])
  }
  return dense
}

/** The points strictly between two ends. */
function appendPieces(dense: Ring, from: Position, to: Position): void {
  const { angle, at } = greatCircle(from, to)
  const pieces = angle === 0 ? 1 : Math.min(MAX_PIECES, Math.max(MIN_PIECES, Math.ceil((angle * MEAN_RADIUS_M) / STEP_M)))
  for (let piece = 1; piece < pieces; piece += 1) dense.push(at(piece / pieces))
}

function wrap(degrees: number): number {
  return degrees > 180 || degrees < -180 ? degrees - 360 * Math.round(degrees / 360) : degrees
}
