import { emptyLine, emptyPart, type LineDraft, type MomentDraft } from './lineDraft.ts'
import { emptyComponent, emptyRecord, type RecordDraft } from './recordDraft.ts'

type Half<Whole> = { [Key in keyof Whole]?: Whole[Key] }
type HalfLine = Half<Omit<LineDraft, 'part' | 'counts'>> & { part?: Half<LineDraft['part']>; counts?: Half<LineDraft['counts']> }
/** The first shape of the form: one block, its times and its amount beside everything else. */
interface FirstShape { blockId?: string; start?: MomentDraft; end?: MomentDraft; amount?: LineDraft['amount'] }
type Kept = Half<Omit<RecordDraft, 'version' | 'lines'>> & FirstShape & { version?: number; lines?: HalfLine[] }

function wholeLine(line: HalfLine): LineDraft {
  const empty = emptyLine(line.blockId ?? '')
  return { ...empty, ...line, part: { ...emptyPart(), ...line.part }, counts: { ...empty.counts, ...line.counts } }
}

/** The one line that the first shape held; none where nothing of it was written. */
function lineOfFirst({ blockId = '', start, end, amount }: FirstShape): LineDraft[] {
  if (blockId === '' && !start?.time && !end?.time) return []
  const empty = emptyLine(blockId)
  const from = start ?? empty.start
  return [{
    ...empty, start: from, amount: amount ?? empty.amount,
    end: end ? { time: end.time, offset: end.offset, nextDay: end.date !== '' && from.date !== '' && end.date > from.date } : empty.end,
  }]
}

/** A form as this or an older program kept it, with what it lacks left empty; nothing that was typed is lost. */
export function readKeptDraft(kept: unknown): RecordDraft {
  const { blockId, start, end, amount, ...typed } = kept as Kept
  const empty = emptyRecord()
  return {
    ...empty,
    ...typed,
    version: empty.version,
    lines: typed.lines?.map(wholeLine) ?? lineOfFirst({ ...(blockId !== undefined && { blockId }), ...(start && { start }), ...(end && { end }), ...(amount && { amount }) }),
    plain: { ...empty.plain, ...typed.plain },
    components: typed.components?.map((component) => ({ ...emptyComponent(), ...component })) ?? empty.components,
    water: { ...empty.water, ...typed.water },
    weather: { ...empty.weather, ...typed.weather },
    stop: { ...empty.stop, ...typed.stop },
  }
}
