import type { Boundary, Ring } from './geometryTypes.ts'

/** The polygons of a boundary, each its outer ring and its holes. */
export function boundaryParts(geometry: Boundary): Ring[][] {
  return geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates
}
