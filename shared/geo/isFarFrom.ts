import { distanceKm } from './distanceKm.ts'
import type { Boundary, Position } from './geometryTypes.ts'

/** A block further from the farm than this is asked about. */
export const FAR_KM = 100

/** True where the middle of a boundary is further from the farm than `limitKm`. */
export function isFarFrom(geometry: Boundary, farmPlace: Position, limitKm = FAR_KM): boolean {
  return distanceKm(geometry, farmPlace) > limitKm
}
