import { tallyChecks } from '../checks/tallyChecks.ts'
import type { Check, RegisterRow } from '../contract/record.ts'
import type { RecordContent } from '../contract/recordContent.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'
import { landFigures } from './landFigures.ts'

const HOUR_MS = 3_600_000
/** Entered later than this after the work ended, a record carries how late. */
export const LATE_HOURS = 24

export interface RowSource {
  content: RecordContent
  sheet: Pick<RecordSheet, 'areaHa' | 'totalL' | 'totalKg' | 'sprayPerEach'>
  checks: readonly Check[]
  blocks: readonly { id: string; code: string }[]
  materials: readonly { id: string; name: string }[]
  lots: readonly { id: string; code: string }[]
  doneBy: string
  signed: { number: string; season: number; version: number; at: string; firstAt: string } | null
}

/** First start of the work, RFC 3339, or null before one is written. */
export function firstStart(content: Pick<RecordContent, 'lines'>): string | null {
  return earliest(content.lines.map(({ startedAt }) => startedAt))
}

/** Last end of the work, or null while a line is open. */
export function lastEnd(content: Pick<RecordContent, 'lines'>): string | null {
  const ends = content.lines.map(({ endedAt }) => endedAt)
  return ends.some((end) => end === null) ? null : earliest(ends, -1)
}

function earliest(instants: readonly (string | null)[], direction = 1): string | null {
  const known = instants.filter((instant) => instant !== null)
  return known.sort((a, b) => direction * (Date.parse(a) - Date.parse(b)))[0] ?? null
}

/** What the register shows of a record; hectares and litres as unrounded decimal text. */
export function registerRow(source: RowSource): Omit<RegisterRow, 'id' | 'state'> {
  const { content, sheet, signed } = source
  const endedAt = lastEnd(content)
  const lateHours = signed && endedAt ? Math.floor((Date.parse(signed.firstAt) - Date.parse(endedAt)) / HOUR_MS) : 0
  const nameOf = <Thing extends { id: string }>(things: readonly Thing[], id: string | null) => things.filter((thing) => thing.id === id)
  return {
    number: signed?.number ?? null,
    season: signed?.season ?? null,
    version: signed?.version ?? 0,
    method: content.method,
    startedAt: firstStart(content),
    endedAt,
    signedAt: signed?.at ?? null,
    blocks: content.lines.flatMap(({ blockId }) => nameOf(source.blocks, blockId).map(({ id, code }) => ({ id, code }))),
    preparations: content.components.flatMap(({ materialId }) => nameOf(source.materials, materialId).map(({ name }) => name)),
    lots: content.components.flatMap(({ lotId }) => nameOf(source.lots, lotId).map(({ code }) => code)),
    areaHa: String(sheet.areaHa),
    ...landFigures(content.lines, sheet),
    by: source.doneBy,
    lateHours: lateHours >= LATE_HOURS ? lateHours : null,
    tally: tallyChecks(source.checks),
  }
}
