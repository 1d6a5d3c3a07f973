import type { Boundary, Position, Ring } from './geometryTypes.ts'

interface Shape<Type, Coordinates> { type: Type; coordinates: Coordinates }

/** A polygon or several as a boundary: positions of longitude and latitude, what stands after them dropped. */
export function asBoundary(shape: Shape<'Polygon', number[][][]> | Shape<'MultiPolygon', number[][][][]>): Boundary {
  const toRing = (ring: number[][]): Ring => ring.map(([lon = 0, lat = 0]): Position => [lon, lat])
  return shape.type === 'Polygon'
    ? { type: 'Polygon', coordinates: shape.coordinates.map(toRing) }
    : { type: 'MultiPolygon', coordinates: shape.coordinates.map((rings) => rings.map(toRing)) }
}
