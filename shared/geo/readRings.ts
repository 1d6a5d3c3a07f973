import type { GeometryFinding } from './geometryTypes.ts'

/** Numbers as they came, third and later coordinates dropped; one list of rings a polygon. */
export interface ReadRings {
  type: 'Polygon' | 'MultiPolygon'
  polygons: [number, number][][][]
  findings: GeometryFinding[]
}

export const MAX_POINTS = 5_000

/**
 * The rings of any value at all: null with its findings where it is not a Polygon or MultiPolygon of numbers, has a `crs` member
 * (RFC 7946 is degrees on WGS84 only) or more than 5 000 points. Never throws.
 */
export function readRings(geometry: unknown): ReadRings | { type: null; findings: GeometryFinding[] } {
  if (!isObject(geometry)) return refuse('geometry.type', { type: nameOf(geometry) })
  if ('crs' in geometry) return refuse('geometry.crs', {})
  const { type, coordinates } = geometry
  if (type !== 'Polygon' && type !== 'MultiPolygon') return refuse('geometry.type', { type: nameOf(type) })
  const nested: unknown = type === 'Polygon' ? [coordinates] : coordinates
  if (!isList(nested)) return refuse('geometry.coordinates', {}, 'coordinates')
  const count = countPoints(nested)
  if (count > MAX_POINTS) return refuse('geometry.too_many_points', { points: count, maximum: MAX_POINTS })
  const polygons: ReadRings['polygons'] = []
  for (const [part, rings] of nested.entries()) {
    const path = type === 'Polygon' ? 'coordinates' : `coordinates.${part}`
    if (!isList(rings)) return refuse('geometry.coordinates', {}, path)
    const read = readPolygon(rings, path)
    if ('code' in read) return { type: null, findings: [read] }
    polygons.push(read)
  }
  return { type, polygons, findings: [] }
}

function readPolygon(rings: readonly unknown[], path: string): [number, number][][] | GeometryFinding {
  const read: [number, number][][] = []
  for (const [index, ring] of rings.entries()) {
    if (!isList(ring)) return { code: 'geometry.coordinates', params: {}, path: `${path}.${index}` }
    const positions: [number, number][] = []
    for (const [place, position] of ring.entries()) {
      const [lon, lat] = Array.isArray(position) ? (position as unknown[]) : []
      if (!isFiniteNumber(lon) || !isFiniteNumber(lat)) {
        return { code: 'geometry.coordinates', params: {}, path: `${path}.${index}.${place}` }
      }
      positions.push([lon, lat])
    }
    read.push(positions)
  }
  return read
}

function countPoints(polygons: readonly unknown[]): number {
  let count = 0
  for (const rings of polygons) {
    if (!Array.isArray(rings)) continue
    for (const ring of rings as unknown[]) count += Array.isArray(ring) ? Math.max(1, ring.length) : 1
  }
  return count
}

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
const isList = (value: unknown): value is unknown[] => Array.isArray(value) && value.length > 0
const isFiniteNumber = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value)

/** What it is in a few letters, never the thing itself. */
const nameOf = (value: unknown): string => (typeof value === 'string' ? value.slice(0, 40) : value === null ? 'null' : typeof value)

function refuse(code: string, params: GeometryFinding['params'], path?: string): { type: null; findings: GeometryFinding[] } {
  return { type: null, findings: [path === undefined ? { code, params } : { code, params, path }] }
}
