import { RADIANS_PER_DEGREE } from './ellipsoid.ts'
import type { Position, Ring } from './geometryTypes.ts'

const STEP_M = 50
/** Short edges of a bed are cut too: uncut, a side of 40 m at 64° costs a part in a million. */
const MIN_PIECES = 4
/** An edge across half the globe is cut coarser rather than into a million pieces. */
const MAX_PIECES = 8_192
const MEAN_RADIUS_M = 6_371_000

type Vector = readonly [number, number, number]

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
  const a = toVector(0, from[1])
  const b = toVector(to[0] - from[0], to[1])
  const angle = angleBetween(a, b)
  const pieces = angle === 0 ? 1 : Math.min(MAX_PIECES, Math.max(MIN_PIECES, Math.ceil((angle * MEAN_RADIUS_M) / STEP_M)))
  const sinAngle = Math.sin(angle)
  for (let piece = 1; piece < pieces; piece += 1) {
    const fraction = piece / pieces
    const wa = Math.sin((1 - fraction) * angle) / sinAngle
    const wb = Math.sin(fraction * angle) / sinAngle
    const x = wa * a[0] + wb * b[0]
    const y = wa * a[1] + wb * b[1]
    const z = wa * a[2] + wb * b[2]
    dense.push([from[0] + Math.atan2(y, x) / RADIANS_PER_DEGREE, Math.atan2(z, Math.hypot(x, y)) / RADIANS_PER_DEGREE])
  }
}

function toVector(lon: number, lat: number): Vector {
  const cosLat = Math.cos(lat * RADIANS_PER_DEGREE)
  return [cosLat * Math.cos(lon * RADIANS_PER_DEGREE), cosLat * Math.sin(lon * RADIANS_PER_DEGREE), Math.sin(lat * RADIANS_PER_DEGREE)]
}

function angleBetween(a: Vector, b: Vector): number {
  const cross = Math.hypot(a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0])
  return Math.atan2(cross, a[0] * b[0] + a[1] * b[1] + a[2] * b[2])
}

function wrap(degrees: number): number {
  return degrees > 180 || degrees < -180 ? degrees - 360 * Math.round(degrees / 360) : degrees
}
