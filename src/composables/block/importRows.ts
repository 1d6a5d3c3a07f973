import { lineText } from '../../../shared/contract/text.ts'
import { IMPORT_LIMITS, type Candidate } from '../../../shared/importing/importTypes.ts'
import { fold } from '../../../shared/importing/proposeCodes.ts'

/** What the person changed of a shape. */
export interface ImportEdit { taken?: boolean; code?: string; name?: string }

/** A shape as the table shows it. */
export interface ImportRow extends Candidate {
  taken: boolean
  /** Keys of messages under `importing.error`. */
  codeError: 'code' | 'twice' | 'taken' | null
  nameError: 'name' | null
}

const codeText = lineText(12)
const nameText = lineText(80)

/**
 * The shapes with what the person changed: ticked at first are those that nothing speaks against. Codes and names of ticked ones
 * are held against what a block can bear, each other, and the farm's own.
 */
export function importRows(candidates: readonly Candidate[], edits: ReadonlyMap<number, ImportEdit>, takenCodes: readonly string[]): ImportRow[] {
  const rows = candidates.map((candidate) => {
    const edit = edits.get(candidate.number) ?? {}
    const isPlain = candidate.cautions.length === 0 && candidate.twin === null
    return {
      ...candidate, code: edit.code ?? candidate.code, name: edit.name ?? candidate.name,
      taken: candidate.geometry !== null && (edit.taken ?? isPlain),
    }
  })
  const onFarm = new Set(takenCodes.map(keyOf))
  const counts = new Map<string, number>()
  for (const { code, taken } of rows) if (taken) counts.set(keyOf(code), (counts.get(keyOf(code)) ?? 0) + 1)
  return rows.map((row): ImportRow => ({ ...row, codeError: row.taken ? codeErrorOf(row.code, counts, onFarm) : null, nameError: row.taken && !nameText.safeParse(row.name).success ? 'name' : null }))
}

function codeErrorOf(code: string, counts: ReadonlyMap<string, number>, onFarm: ReadonlySet<string>): ImportRow['codeError'] {
  if (!codeText.safeParse(code).success) return 'code'
  if (onFarm.has(keyOf(code))) return 'taken'
  return (counts.get(keyOf(code)) ?? 0) > 1 ? 'twice' : null
}

const keyOf = (code: string): string => fold(code.normalize('NFC').trim())

export interface ImportCount { read: number; taken: number; refused: number; left: number }

/** Every shape once: coming in, refused, or left out by the person. */
export function countRows(rows: readonly ImportRow[]): ImportCount {
  const taken = rows.filter((row) => row.taken).length
  const refused = rows.filter((row) => row.geometry === null).length
  return { read: rows.length, taken, refused, left: rows.length - taken - refused }
}

/** Why the ticked ones cannot be sent together, as a key under `importing.error`; null where they can. */
export function faultOfAll({ taken }: ImportCount, bytes: number): 'none' | 'many' | 'heavy' | null {
  if (taken === 0) return 'none'
  if (taken > IMPORT_LIMITS.blocks) return 'many'
  return bytes > MOST_BYTES ? 'heavy' : null
}

/** The server takes 1 MB at once. */
const MOST_BYTES = 950_000
