/** Positions in the rings of a polygon or several, whatever they hold. */
export function countPoints(geometry: unknown): number {
  const { type, coordinates } = geometry as { type?: unknown; coordinates?: unknown }
  const polygons = type === 'MultiPolygon' ? coordinates : [coordinates]
  if (!Array.isArray(polygons)) return 0
  return polygons.flatMap((rings: unknown) => (Array.isArray(rings) ? (rings as unknown[]) : [])).reduce((sum: number, ring) => sum + (Array.isArray(ring) ? ring.length : 0), 0)
}
