import type { Boundary } from '../../../shared/contract/block.ts'
import { EACH, type Each } from '../../../shared/contract/each.ts'
import type { KnownAmount } from '../../../shared/contract/quantity.ts'
import type { BlockLine, Part } from '../../../shared/contract/recordContent.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { toInstant } from '../../../shared/time/toInstant.ts'
import { newId } from '../form/newId.ts'

/** A time of the farm's clock; `offset` is chosen only where the clock shows it twice. */
export interface MomentDraft {
  date: string
  time: string
  offset: string
}

/** An amount as typed; worked out, it is the sheet's, and `value` is not read. */
export interface AmountDraft {
  value: string
  unit: string
  known: KnownAmount['known']
}

/** What share of a block was treated, as typed: each kind reads its own fields. */
export interface PartDraft {
  kind: Part['kind']
  fraction: string
  from: string
  to: string
  of: string
  geometry: Boundary | null
}

/** One block's line of the form. */
export interface LineDraft {
  key: string
  blockId: string
  part: PartDraft
  counts: Record<Each, string>
  stage: string
  bbch: string
  start: MomentDraft
  /** On the day of the start, or on the next one where the person said so. */
  end: { time: string; offset: string; nextDay: boolean }
  amount: AmountDraft
  /** Planned and not sprayed: it stays here and goes into no record. */
  skipped: boolean
}

export const emptyAmount = (unit = 'L'): AmountDraft => ({ value: '', unit, known: 'workedOut' })
export const emptyPart = (): PartDraft => ({ kind: 'whole', fraction: '', from: '', to: '', of: '', geometry: null })
const emptyCounts = (): LineDraft['counts'] => Object.fromEntries(EACH.map((each) => [each, ''])) as LineDraft['counts']

export const emptyLine = (blockId: string): LineDraft => ({
  key: newId(), blockId, part: emptyPart(), counts: emptyCounts(), stage: '', bbch: '',
  start: { date: '', time: '', offset: '' }, end: { time: '', offset: '', nextDay: false }, amount: emptyAmount(), skipped: false,
})

/** The end of a line with its day; no day while the start has none. */
export function endMoment({ start, end }: Pick<LineDraft, 'start' | 'end'>): MomentDraft {
  const date = end.nextDay && start.date !== '' ? addDays(start.date, 1) : start.date
  return { date, time: end.time, offset: end.offset }
}

/** The farm's clock at an instant. */
export function momentAt(zone: string, instant: string): MomentDraft {
  const moment = { date: civilDateIn(zone, instant), time: civilTimeIn(zone, instant) }
  const read = toInstant({ ...moment, zone })
  if (read.ok || read.problem.id !== 'time.ambiguous') return { ...moment, offset: '' }
  const near = read.candidates.findLast((one) => Date.parse(one.instant) <= Date.parse(instant))
  return { ...moment, offset: near?.offset ?? '' }
}

/** An end at an instant, said by its day beside that of the start. */
export function endAt(zone: string, instant: string, startDate: string): LineDraft['end'] {
  const { date, time, offset } = momentAt(zone, instant)
  return { time, offset, nextDay: startDate !== '' && date > startDate }
}

function draftOfPart(part: Part): PartDraft {
  const empty = emptyPart()
  switch (part.kind) {
    case 'whole':
      return empty
    case 'fraction':
      return { ...empty, kind: 'fraction', fraction: part.fraction }
    case 'drawn':
      return { ...empty, kind: 'drawn', geometry: part.geometry }
    default:
      return { ...empty, kind: part.kind, from: String(part.from), to: String(part.to), of: String(part.of) }
  }
}

/** The form of a line that was written before. */
export function draftOfLine(line: BlockLine, zone: string): LineDraft {
  const empty = emptyLine(line.blockId)
  const start = line.startedAt === null ? empty.start : momentAt(zone, line.startedAt)
  return {
    ...empty,
    part: draftOfPart(line.part),
    counts: { ...empty.counts, ...line.counts },
    stage: line.stage ?? '',
    bbch: line.bbch ?? '',
    start,
    end: line.endedAt === null ? empty.end : endAt(zone, line.endedAt, start.date),
    amount: line.amount ?? empty.amount,
  }
}
