import { IMPORT_LIMITS, type ImportFormat, type ReadFile, type ReadShape } from '../importTypes.ts'
import { ImportFault } from './importFault.ts'
import { readGeoJson } from './readGeoJson.ts'
import { readShapefile } from './readShapefile.ts'
import { readText } from './readText.ts'
import { readXml } from './readXml.ts'
import { readZip } from './readZip.ts'

interface Part { format: ImportFormat; shapes: ReadShape[]; system: string | null; fileName?: string }

/**
 * The shapes of a file, whatever its name says: GeoJSON, KML, GPX, or a zip of these (a KMZ is one) or of shapefiles.
 * @throws {ImportFault} if it is beyond the limits or holds nothing that can be read.
 */
export function readImport(bytes: Uint8Array): ReadFile {
  if (bytes.byteLength === 0) throw new ImportFault('empty')
  if (bytes.byteLength > IMPORT_LIMITS.fileMB * 1_000_000) throw new ImportFault('size', { most: IMPORT_LIMITS.fileMB })
  const { parts, notRead } = isZip(bytes) ? readParts(bytes) : { parts: [readPlain(bytes)], notRead: [] }
  const first = parts[0]
  if (first === undefined) throw new ImportFault('zip_nothing')
  const isOne = parts.filter((part) => part.shapes.length > 0).length === 1
  const shapes = parts.flatMap((part) => part.shapes.map((shape) => withFileName(shape, isOne ? undefined : part.fileName)))
  assertFew(shapes)
  return {
    format: first.format, shapes, notRead,
    system: [...new Set(parts.flatMap(({ system }) => (system === null ? [] : [system])))].join(', ') || null,
    columns: [...new Set(shapes.flatMap(({ properties }) => Object.keys(properties)))],
  }
}

const isZip = (bytes: Uint8Array): boolean => bytes[0] === 0x50 && bytes[1] === 0x4b

function readPlain(bytes: Uint8Array): Part {
  const text = readText(bytes).replace(/^\uFEFF/, '')
  const first = text.trimStart()[0]
  if (first === '<') return { ...readXml(text), system: null }
  if (first === '{') return { format: 'geojson', ...readGeoJson(text) }
  throw new ImportFault('format')
}

function readParts(bytes: Uint8Array): { parts: Part[]; notRead: string[] } {
  const { files, notRead } = readZip(bytes)
  const find = (stem: string, ending: string): Uint8Array | undefined =>
    files.find(({ name }) => name.toLowerCase() === `${stem}.${ending}`.toLowerCase())?.bytes
  const parts = files.flatMap((file): Part[] => {
    const stem = file.name.replace(/\.[^.]*$/, '')
    const fileName = stem.split('/').at(-1) ?? stem
    if (/\.shp$/i.test(file.name)) {
      return [{ format: 'shapefile', fileName, ...readShapefile({ shp: file.bytes, dbf: find(stem, 'dbf'), prj: find(stem, 'prj'), cpg: find(stem, 'cpg') }) }]
    }
    return /\.(?:kml|gpx|geojson|json)$/i.test(file.name) ? [{ fileName, ...readPlain(file.bytes) }] : []
  })
  return { parts, notRead }
}

function withFileName(shape: ReadShape, file: string | undefined): ReadShape {
  return file === undefined ? shape : { ...shape, properties: { ...shape.properties, file } }
}

function assertFew(shapes: readonly ReadShape[]): void {
  if (shapes.length === 0) throw new ImportFault('nothing')
  if (shapes.length > IMPORT_LIMITS.shapes) throw new ImportFault('shapes', { found: shapes.length, most: IMPORT_LIMITS.shapes })
  const points = shapes.reduce((sum, { geometry }) => sum + countPositions(geometry), 0)
  if (points > IMPORT_LIMITS.points) throw new ImportFault('points', { found: points, most: IMPORT_LIMITS.points })
}

/** Positions anywhere in a geometry; walked in a list of what is left, so that no nesting is too deep. */
function countPositions(geometry: unknown): number {
  let count = 0
  const left: unknown[] = [geometry]
  while (left.length > 0) {
    const next = left.pop()
    if (Array.isArray(next)) {
      if (typeof next[0] === 'number') count += 1
      else for (const each of next as unknown[]) left.push(each)
    } else if (typeof next === 'object' && next !== null) left.push(Reflect.get(next, 'coordinates'), Reflect.get(next, 'geometries'))
  }
  return count
}
