import type { ReadShape } from '../importTypes.ts'
import { ImportFault } from './importFault.ts'
import { readProperties } from './readProperties.ts'

/** Names under which older files say "longitude and latitude on WGS 84", which RFC 7946 takes for granted. */
const DEGREES = /(?:CRS84|EPSG:(?::|[\d.]+:)?4326)$/i
const GEOMETRIES = new Set(['Point', 'MultiPoint', 'LineString', 'MultiLineString', 'Polygon', 'MultiPolygon', 'GeometryCollection'])

/**
 * The shapes of a GeoJSON text: of a collection, one feature or one geometry.
 * @throws {ImportFault} if it is not GeoJSON or names a reference system other than WGS 84.
 */
export function readGeoJson(text: string): { shapes: ReadShape[]; system: string | null } {
  const root = parse(text)
  const system = systemOf(root['crs'])
  if (system !== null && !DEGREES.test(system)) throw new ImportFault('crs', { system: system.slice(0, 80) })
  if (root['type'] === 'FeatureCollection') {
    if (!Array.isArray(root['features'])) throw new ImportFault('geojson')
    return { shapes: root['features'].map(shapeOf), system }
  }
  if (root['type'] === 'Feature') return { shapes: [shapeOf(root)], system }
  if (GEOMETRIES.has(String(root['type']))) return { shapes: [{ geometry: root, properties: {}, refusal: null }], system }
  throw new ImportFault('geojson')
}

function parse(text: string): Record<string, unknown> {
  let read: unknown
  try {
    read = JSON.parse(text)
  } catch {
    throw new ImportFault('json')
  }
  if (!isObject(read)) throw new ImportFault('geojson')
  return read
}

function shapeOf(feature: unknown): ReadShape {
  if (!isObject(feature)) return { geometry: null, properties: {}, refusal: null }
  const id = feature['id']
  const named = typeof id === 'string' || typeof id === 'number' ? { id } : {}
  const own = isObject(feature['properties']) ? feature['properties'] : {}
  return { geometry: feature['geometry'] ?? null, properties: readProperties({ ...named, ...own }), refusal: null }
}

/** The name of a `crs` member as the first edition of GeoJSON wrote it; null where there is none. */
function systemOf(crs: unknown): string | null {
  if (crs === undefined || crs === null) return null
  const properties = isObject(crs) ? crs['properties'] : undefined
  const name = isObject(properties) ? properties['name'] : undefined
  return typeof name === 'string' ? name : 'crs'
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value)
