import { RADIANS_PER_DEGREE } from './ellipsoid.ts'
import type { Position } from './geometryTypes.ts'

type Vector = readonly [number, number, number]

/** The great circle between two positions, ready to be walked along. */
export interface GreatCircle {
  /** Radians from end to end. */
  angle: number
  /** The position at a fraction of the way, 0 to 1; longitudes count on from the first end's. */
  at: (fraction: number) => Position
}

/** The great circle from one position to another: the way an edge is measured and drawn. */
export function greatCircle(from: Position, to: Position): GreatCircle {
  const a = toVector(0, from[1])
  const b = toVector(to[0] - from[0], to[1])
  const angle = angleBetween(a, b)
  const sinAngle = Math.sin(angle)
  return {
    angle,
    at: (fraction) => {
      if (angle === 0) return [from[0], from[1]]
      const wa = Math.sin((1 - fraction) * angle) / sinAngle
      const wb = Math.sin(fraction * angle) / sinAngle
      const x = wa * a[0] + wb * b[0]
      const y = wa * a[1] + wb * b[1]
      const z = wa * a[2] + wb * b[2]
      return [from[0] + Math.atan2(y, x) / RADIANS_PER_DEGREE, Math.atan2(z, Math.hypot(x, y)) / RADIANS_PER_DEGREE]
    },
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
