import type { Boundary, Position, Ring } from '../../../shared/geo/geometryTypes.ts'

/** A closed square of a side in degrees, counter-clockwise from its south-west corner, 7 decimals. */
export function buildSquare(lon: number, lat: number, side = 0.001): Ring {
  const at = (x: number, y: number): Position => [round(lon + x), round(lat + y)]
  return [at(0, 0), at(side, 0), at(side, side), at(0, side), at(0, 0)]
}

export const buildPolygon = (...rings: Ring[]): Boundary => ({ type: 'Polygon', coordinates: rings })
export const buildMultiPolygon = (...parts: Ring[][]): Boundary => ({ type: 'MultiPolygon', coordinates: parts })

/** The same ring started at another corner. */
export function startAt(ring: Ring, corner: number): Ring {
  const open = ring.slice(0, -1)
  const turned = [...open.slice(corner), ...open.slice(0, corner)]
  return [...turned, ...turned.slice(0, 1)]
}

const round = (degrees: number): number => Math.round(degrees * 1e7) / 1e7
