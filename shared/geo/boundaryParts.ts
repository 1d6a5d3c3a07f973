import type { Boundary, Position, Ring } from './geometryTypes.ts'

/** The polygons of a boundary, each its outer ring and its holes. */
export function boundaryParts(geometry: Boundary): Ring[][] {
  return geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates
}

/** A corner of a boundary, [lon, lat]; undefined where it has none. */
export function firstCorner(geometry: Boundary): Position | undefined {
  return boundaryParts(geometry)[0]?.[0]?.[0]
}
