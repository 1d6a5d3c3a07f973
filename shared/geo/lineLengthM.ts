import { metresPerDegree } from './ellipsoid.ts'
import type { Position } from './geometryTypes.ts'

/**
 * Length of a line on the WGS84 ellipsoid, metres, unrounded; within 1 part in 100 000 of the geodesic answer for pieces under 2 km.
 * @source radii of curvature at the middle latitude of each piece, see `metresPerDegree`.
 */
export function lineLengthM(line: readonly Position[]): number {
  let length = 0
  for (let index = 1; index < line.length; index += 1) {
    const [lonA = 0, latA = 0] = line[index - 1] ?? []
    const [lonB = 0, latB = 0] = line[index] ?? []
    const metres = metresPerDegree((latA + latB) / 2)
    length += Math.hypot((lonB - lonA) * metres.east, (latB - latA) * metres.north)
  }
  return length
}
