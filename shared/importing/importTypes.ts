import type { Message } from '../contract/common.ts'
import type { Boundary } from '../geo/geometryTypes.ts'

export const IMPORT_FORMATS = ['geojson', 'kml', 'gpx', 'shapefile'] as const
export type ImportFormat = (typeof IMPORT_FORMATS)[number]

/** What is read at most; said on the screen and kept by the reader. */
export const IMPORT_LIMITS = {
  /** Of the file as it is chosen. */
  fileMB: 20,
  /** Of everything read out of a zip, unpacked. */
  unpackedMB: 5,
  zipEntries: 20,
  /** Unpacked over packed, for an entry of more than 1 MB. */
  zipRatio: 100,
  shapes: 2_000,
  points: 100_000,
  /** In one go, all or nothing. */
  blocks: 500,
} as const

/** One shape as the file holds it. */
export interface ReadShape {
  /** GeoJSON geometry in degrees, longitude first; anything at all, null where the file has none. */
  geometry: unknown
  /** What the file says of it, column by column, as text. */
  properties: Record<string, string>
  /** Why it cannot become a block whatever is done, where the reader knows. */
  refusal: Message | null
}

/** A file read whole. */
export interface ReadFile {
  format: ImportFormat
  /** The reference system it names; null where it names none and degrees on WGS 84 are taken. */
  system: string | null
  shapes: ReadShape[]
  /** Columns with anything in them, in the file's order. */
  columns: string[]
  /** Files of a zip that hold no shapes. */
  notRead: string[]
}

/** How the person wants the shapes taken. */
export interface ImportOptions {
  /** Latitude and longitude stand the wrong way round in the file. */
  swap: boolean
  /** Lines and open rings become outlines. */
  close: boolean
  /** Outlines finer than needed are thinned so that none moves farther than this, in metres; 0 leaves them. */
  toleranceM: number
  nameColumn: string | null
  codeColumn: string | null
  cropColumn: string | null
}

/** A shape that may become a block, or why it cannot. */
export interface Candidate {
  /** Place in the file, from 1. */
  number: number
  name: string
  code: string
  crop: string
  /** Cleaned and measured; null where it is refused. */
  geometry: Boundary | null
  areaM2: number
  /** Points of its outline as it would be kept, and as the file has it. */
  points: number
  pointsRead: number
  refusals: Message[]
  /** Unlikely: comes in only when ticked, with a reason. */
  cautions: { code: string; message: Message }[]
  /** Which block or shape it seems to be once more. */
  twin: Message | null
  /** What was done to it or left out of it, to be read. */
  notes: Message[]
}
