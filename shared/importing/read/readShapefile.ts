import proj4 from 'proj4'
import { parseDbf, parseShp } from 'shpjs'
import type { ReadShape } from '../importTypes.ts'
import { ImportFault } from './importFault.ts'
import { readProperties } from './readProperties.ts'

/** The files of one layer; all but its shapes may be missing. */
export interface Layer { shp: Uint8Array; dbf?: Uint8Array | undefined; prj?: Uint8Array | undefined; cpg?: Uint8Array | undefined }

type Move = (at: [number, number]) => [number, number]

/**
 * The shapes of a shapefile, brought to WGS 84 by its .prj. Without one its figures are left as they are: degrees pass, metres
 * are then refused shape by shape.
 * @throws {ImportFault} if it is cut off, if its rows are not as many as its shapes, or if its .prj cannot be worked with.
 */
export function readShapefile({ shp, dbf, prj, cpg }: Layer): { shapes: ReadShape[]; system: string | null } {
  assertWhole(shp)
  const projection = prj === undefined ? null : readProjection(new TextDecoder().decode(prj))
  const shapes = attempt(() => parseShp(shp), 'shp')
  const rows = dbf === undefined ? [] : readRows(dbf, cpg)
  if (dbf !== undefined && rows.length !== shapes.length) throw new ImportFault('shp_rows', { shapes: shapes.length, rows: rows.length })
  return {
    system: projection?.name ?? null,
    shapes: shapes.map((shape, index) => ({
      geometry: shape === null ? null : { type: shape.type, coordinates: projection === null ? shape.coordinates : moveAll(shape.coordinates, projection.move) },
      properties: readProperties(rows[index]),
      refusal: null,
    })),
  }
}

/** The length that the head of a .shp names, in 16-bit words, against what is there; the reader would stop quietly. */
function assertWhole(shp: Uint8Array): void {
  const view = new DataView(shp.buffer, shp.byteOffset, shp.byteLength)
  if (shp.byteLength < 100 || view.getInt32(0) !== 9994 || view.getInt32(24) * 2 !== shp.byteLength) throw new ImportFault('shp')
}

function readRows(dbf: Uint8Array, cpg: Uint8Array | undefined): Record<string, unknown>[] {
  const view = new DataView(dbf.buffer, dbf.byteOffset, dbf.byteLength)
  const isWhole = dbf.byteLength >= 32 && view.getUint16(8, true) + view.getUint32(4, true) * view.getUint16(10, true) <= dbf.byteLength
  if (!isWhole || view.getUint16(10, true) === 0) throw new ImportFault('dbf')
  return attempt(() => parseDbf(dbf, cpg ?? encodingOf(dbf)), 'dbf')
}

/** Where no .cpg says it: UTF-8 if its bytes are, or else the letters of western Europe. */
function encodingOf(dbf: Uint8Array): Uint8Array {
  const name = isUtf8(dbf.subarray(dbf[8] ?? 0)) ? 'utf-8' : 'windows-1252'
  return new TextEncoder().encode(name)
}

function isUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes)
    return true
  } catch {
    return false
  }
}

function readProjection(wkt: string): { name: string; move: Move } {
  const name = /^\s*\w+\s*\[\s*"([^"]{1,80})"/.exec(wkt)?.[1]
  if (name === undefined) throw new ImportFault('prj')
  const converter = attempt(() => proj4(wkt, 'WGS84'), 'prj')
  return { name: name.replaceAll('_', ' '), move: ([x, y]) => converter.forward([x, y]) }
}

/** Every position of nested lists of coordinates, moved; heights fall away. */
function moveAll(nested: unknown, move: Move): unknown {
  if (!Array.isArray(nested)) return nested
  const [x, y] = nested as unknown[]
  if (typeof x === 'number' && typeof y === 'number') return attempt(() => move([x, y]), 'prj')
  return nested.map((each: unknown) => moveAll(each, move))
}

function attempt<Result>(read: () => Result, code: string): Result {
  try {
    return read()
  } catch (error) {
    if (error instanceof ImportFault) throw error
    throw new ImportFault(code)
  }
}
