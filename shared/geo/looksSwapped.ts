import { distanceKm } from './distanceKm.ts'
import type { Boundary, Position } from './geometryTypes.ts'
import { FAR_KM } from './isFarFrom.ts'
import { middleOf } from './middleOf.ts'

/** True where a boundary is far from the farm as it stands and within 100 km with longitude and latitude exchanged. */
export function looksSwapped(geometry: Boundary, farmPlace: Position): boolean {
  const [lon, lat] = middleOf(geometry)
  if (distanceKm([lon, lat], farmPlace) <= FAR_KM || Math.abs(lon) > 90) return false
  return distanceKm([lat, lon], farmPlace) <= FAR_KM
}
