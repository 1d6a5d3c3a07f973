import { centroid } from '@turf/turf'
import type { Boundary, Position } from './geometryTypes.ts'

/** The middle of a boundary's corners, [longitude, latitude] in degrees: good for distances and map views, no centre of mass. */
export function middleOf(geometry: Boundary): Position {
  const [lon = 0, lat = 0] = centroid(geometry).geometry.coordinates
  return [lon, lat]
}
