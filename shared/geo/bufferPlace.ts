import { buffer } from '@turf/turf'
import type { Boundary, PlaceGeometry } from './geometryTypes.ts'

/** Corners of a quarter circle. */
const STEPS = 12

/**
 * The ground within a distance of a point, line or outline, its own ground counted, as drawn.
 * @param metres above 0. @returns null where there is nothing to draw it round.
 * @throws {RangeError} if the distance is not above 0.
 * @source turf's buffer on a plane about the geometry's middle, on a sphere: within 0.6 % of the geodesic distance.
 */
export function bufferPlace(geometry: PlaceGeometry, metres: number): Boundary | null {
  if (!(metres > 0) || !Number.isFinite(metres)) throw new RangeError(`metres must be above 0, is ${metres}`)
  return (buffer(geometry, metres, { units: 'meters', steps: STEPS })?.geometry as Boundary | undefined) ?? null
}
