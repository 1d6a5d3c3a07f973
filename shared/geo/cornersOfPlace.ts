import type { PlaceGeometry, Position } from './geometryTypes.ts'

/** The corners of a point, a line or an outline as they were drawn: an outline's first is not repeated, its holes are left out. */
export function cornersOfPlace(geometry: PlaceGeometry): Position[] {
  if (geometry.type === 'Point') return [geometry.coordinates]
  return geometry.type === 'LineString' ? geometry.coordinates : (geometry.coordinates[0] ?? []).slice(0, -1)
}
