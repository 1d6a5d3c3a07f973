import type { ImportOptions, ReadFile } from './importTypes.ts'

const NAMES = ['name', 'label', 'title', 'nombre', 'block_name', 'field_name', 'description', 'folder']
const CODES = ['code', 'block', 'block_id', 'field_id', 'codigo', 'código', 'parcela', 'field', 'parcel']
const CROPS = ['crop', 'cultivo', 'crop_name']

/** Which columns of a file hold name, code and crop, by what they are called. */
export function guessColumns({ columns }: Pick<ReadFile, 'columns'>): Pick<ImportOptions, 'nameColumn' | 'codeColumn' | 'cropColumn'> {
  const find = (wanted: readonly string[]): string | null =>
    wanted.map((word) => columns.find((column) => column.toLowerCase() === word)).find((column) => column !== undefined) ?? null
  return { nameColumn: find(NAMES), codeColumn: find(CODES), cropColumn: find(CROPS) }
}
