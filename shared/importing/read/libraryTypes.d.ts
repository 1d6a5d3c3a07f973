/** What is used of a library that brings no types: records of a .shp in its own coordinates, and rows of a .dbf. */
declare module 'shpjs' {
  export function parseShp(shp: Uint8Array): ({ type: string; coordinates: unknown } | null)[]
  export function parseDbf(dbf: Uint8Array, cpg?: Uint8Array): Record<string, unknown>[]
}
