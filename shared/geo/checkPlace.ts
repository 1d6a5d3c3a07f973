import { checkBoundary } from './checkBoundary.ts'
import type { GeometryFinding, PlaceGeometry, Position } from './geometryTypes.ts'
import { GRID_PER_DEGREE } from './gridRing.ts'
import { MAX_POINTS } from './readRings.ts'

export interface PlaceCheck {
  /** The geometry cleaned, or null where anything impossible was found. */
  geometry: PlaceGeometry | null
  findings: GeometryFinding[]
}

/** Numbers beyond this are metres of some projection. */
const PROJECTED = 1_000

/**
 * Whether any value at all is a Point, a LineString or a Polygon (RFC 7946) that can stand on a farm: positions on the globe, a line of two
 * places at least, a polygon as `checkBoundary` takes it. Heights are dropped, coordinates rounded to 7 decimals, repeated neighbours
 * taken out. Never throws.
 *
 * Codes beside those of `checkBoundary`: `geometry.place_type`, `geometry.line_short`.
 */
export function checkPlace(geometry: unknown): PlaceCheck {
  const { type, coordinates, crs } = typeof geometry === 'object' && geometry !== null ? (geometry as Record<string, unknown>) : {}
  if (crs !== undefined) return refuse('geometry.crs')
  if (type === 'Polygon') {
    const checked = checkBoundary(geometry)
    return { geometry: checked.geometry?.type === 'Polygon' ? checked.geometry : null, findings: checked.findings }
  }
  if (type === 'Point') {
    const read = readPositions([coordinates])
    return 'code' in read ? { geometry: null, findings: [read] } : { geometry: { type, coordinates: read[0] ?? [0, 0] }, findings: [] }
  }
  return type === 'LineString' ? checkLine(coordinates) : refuse('geometry.place_type')
}

function checkLine(coordinates: unknown): PlaceCheck {
  if (!Array.isArray(coordinates)) return refuse('geometry.coordinates')
  if (coordinates.length > MAX_POINTS) return refuse('geometry.too_many_points', { points: coordinates.length, maximum: MAX_POINTS })
  const read = readPositions(coordinates)
  if ('code' in read) return { geometry: null, findings: [read] }
  const line = read.filter((position, index) => index === 0 || position.some((value, axis) => value !== read[index - 1]?.[axis]))
  if (line.length < 2) return refuse('geometry.line_short')
  if (line.some(([lon], index) => Math.abs(lon - (line[index - 1]?.[0] ?? lon)) > 180)) return refuse('geometry.crosses_antimeridian')
  return { geometry: { type: 'LineString', coordinates: line }, findings: [] }
}

function readPositions(values: readonly unknown[]): Position[] | GeometryFinding {
  const read: Position[] = []
  for (const value of values) {
    const [lon, lat] = Array.isArray(value) ? (value as unknown[]) : []
    if (typeof lon !== 'number' || typeof lat !== 'number' || !Number.isFinite(lon) || !Number.isFinite(lat)) return { code: 'geometry.coordinates', params: {} }
    if (Math.max(Math.abs(lon), Math.abs(lat)) > PROJECTED) return { code: 'geometry.degrees_needed', params: { lon, lat } }
    if (Math.abs(lon) > 180 || Math.abs(lat) > 90) return { code: 'geometry.out_of_range', params: { lon, lat } }
    read.push([toGrid(lon), toGrid(lat)])
  }
  return read
}

/** On the grid of 7 decimals; adding 0 turns −0 into 0. */
const toGrid = (degrees: number): number => Math.round(degrees * GRID_PER_DEGREE) / GRID_PER_DEGREE + 0

function refuse(code: string, params: GeometryFinding['params'] = {}): PlaceCheck {
  return { geometry: null, findings: [{ code, params }] }
}
