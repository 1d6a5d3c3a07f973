import { MOST_OVER } from '../../../shared/checks/judgeLikely.ts'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { lastEnd } from '../../../shared/records/registerRow.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { roundDecimal } from '../../../shared/units/roundDecimal.ts'
import type { FieldError } from '../../errors.ts'

const DAY_MS = 86_400_000
/** A record entered later than this needs a reason. */
const LATE_DAYS = 30

/** What a record lacks before it can be signed: what happened must be said whole. */
export function findMissing(content: RecordContent, sheet: RecordSheet): FieldError[] {
  const missing = [
    ...content.lines.flatMap(({ startedAt, endedAt }, index) => [
      ...(startedAt === null ? [{ path: `lines.${index}.startedAt`, code: 'time.missing_start' }] : []),
      ...(endedAt === null ? [{ path: `lines.${index}.endedAt`, code: 'time.missing_end' }] : []),
    ]),
    ...(content.components.length === 0 ? [{ path: 'components', code: 'record.component_missing' }] : []),
    ...(content.water === null && content.method !== 'solid' ? [{ path: 'water', code: 'record.water_missing' }] : []),
    ...(content.sprayerId === null && content.components.some(({ basis }) => basis.kind === 'perTank') ? [{ path: 'sprayerId', code: 'sprayer.needed' }] : []),
  ]
  const blank = (sheet.totalL === null && sheet.totalKg === null) || sheet.components.some(({ amount }) => amount === null)
  return missing.length === 0 && blank ? [{ path: 'components', code: 'record.figures_missing' }] : missing
}

/**
 * What is unlikely about signing this: each stop, an ingredient of no lot, more on the land than was in the mix, and a very late entry. A reason for `record.stop` covers every
 * stop, a reason for a check's own code that one.
 */
export function findUnlikely(
  content: RecordContent,
  { sheet, checks }: { sheet: RecordSheet; checks: Check[] },
  acknowledged: Acknowledged,
  now: Date,
): FieldError[] {
  const given = new Set(acknowledged.map(({ code }) => code))
  const stops = checks
    // A lot that is short is asked for by the draw itself, with its figures.
    .filter(({ verdict, code }) => verdict === 'stop' && code !== 'lot.left' && !given.has('record.stop') && !given.has(code))
    .map(({ code, about, title }) => ({ path: about ?? '', code: 'record.stop', params: { checkCode: code }, about: title }))
  const end = lastEnd(content)
  const days = end === null ? 0 : Math.floor((now.getTime() - Date.parse(end)) / DAY_MS)
  const late = days > LATE_DAYS && !given.has('record.late') ? [{ path: 'lines', code: 'record.late', params: { days } }] : []
  const untraced = given.has('lot.missing') ? [] : content.components.flatMap(({ lotId }, index) => (lotId === null ? [{ path: `components.${index}.lotId`, code: 'lot.missing' }] : []))
  return [...stops, ...untraced, ...findTooMuch(sheet).filter(({ code }) => !given.has(code)), ...late]
}

function findTooMuch({ appliedL, totalL, appliedKg, totalKg }: RecordSheet): FieldError[] {
  return [...compare(appliedL, totalL), ...(totalL === null ? compare(appliedKg, totalKg) : [])]
}

function compare(applied: string | null, total: number | null): FieldError[] {
  if (applied === null || total === null || Number(applied) <= total * (1 + MOST_OVER)) return []
  return [{ path: 'lines', code: 'total.inconsistent', params: { applied: Number(roundDecimal(applied, 1)), total: Number(roundDecimal(String(total), 1)) } }]
}
