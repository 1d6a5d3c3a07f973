import { buffer } from '@turf/turf'
import type { Boundary } from './geometryTypes.ts'

/**
 * The ground of an outline that lies farther in than a distance, as drawn.
 * @param metres above 0. @returns null where no ground lies that far in.
 * @throws {RangeError} if the distance is not above 0.
 * @source turf's buffer on a plane about the geometry's middle, as `bufferPlace` uses it.
 */
export function insetBoundary(geometry: Boundary, metres: number): Boundary | null {
  if (!(metres > 0) || !Number.isFinite(metres)) throw new RangeError(`metres must be above 0, is ${metres}`)
  const inset = buffer(geometry, -metres, { units: 'meters' })?.geometry as Boundary | undefined
  return inset === undefined || inset.coordinates.length === 0 ? null : inset
}
