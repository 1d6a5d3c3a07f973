import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { extraDigits } from '../../../shared/units/extraDigits.ts'
import type { Column, Table, TableRow } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import type { Span } from '../parts/wrapText.ts'
import { pairBlocks, type PairedLine } from './pairBlocks.ts'
import { countWords, isCounted, lineCountWords, partWords, stageWords } from './partWords.ts'
import type { RecordFigures } from './recordFigures.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

/** With more blocks than this the facts name none; crop and boundary then stand in the table. */
export const BLOCKS_IN_FACTS = 6

interface LinesInput {
  signed: SignedRecord
  figures: RecordFigures
  words: ReportWords
  place: { x: number; width: number }
  /** Beside the plan: there is room for the bare columns. */
  isNarrow?: boolean
}

/** The table of block lines. */
export interface LinesTable {
  table: Table
  /** False where the rounded figures of a column do not come to the total that is printed. */
  addsUp: boolean
}

export function blockLinesTable({ signed, figures, words, place, isNarrow = false }: LinesInput): LinesTable {
  const { say } = words
  const pairs = pairBlocks(signed)
  const context: Context = { signed, words, showsHolds: hasHolds(signed), isMany: signed.blocks.length > BLOCKS_IN_FACTS, hasOneStage: oneStage(signed) !== null }
  const areas = areaColumn(pairs, signed, words)
  const amounts = amountColumn(pairs, figures, words)
  const rows: TableRow[] = pairs.map((pair, index) => ({
    hasHead: true,
    cells: [
      nameOf(pair, context),
      plain(areas.cells[index] ?? ''),
      plain(lineTime(pair.line.startedAt, signed, words)),
      plain(lineTime(pair.line.endedAt, signed, words)),
      plain(amounts.cells[index]?.text ?? ''),
      plain(amounts.cells[index]?.known ?? ''),
      ...(context.showsHolds ? holdCells(pair, words) : []),
    ],
  }))
  rows.push({
    isTotal: true, hasHead: true,
    cells: [totalName(signed, words), bold(areas.total), [], [], bold(amounts.total), [], ...(context.showsHolds ? [[], []] : [])],
  })
  const last = rows.at(-2)
  if (last) last.keepsWithNext = true
  return {
    table: { x: place.x, columns: columns(say, context, { width: place.width, isNarrow }), rows, leading: STYLES.body.leading, padding: 2.4, showsHeads: true },
    addsUp: areas.addsUp && amounts.addsUp,
  }
}

/** Whether a label in the mix holds anything; false too where the text is older than holds on lines. */
export function hasHolds({ computed }: SignedRecord): boolean {
  return computed.lines.some(({ reEntryUntil, pickFrom }) => reEntryUntil !== null || pickFrom !== null)
}

const MOST_BESIDE_PLAN = 4

/** Whether the lines are few and plain enough to stand beside the plan. */
export function fitsBesidePlan(signed: SignedRecord): boolean {
  const { lines } = signed.content
  return lines.length <= MOST_BESIDE_PLAN && !hasHolds(signed) && oneStage(signed) !== null && pairBlocks(signed).every(({ line, block }) =>
    line.part.kind === 'whole' && Object.keys(line.counts).length === 0 && block.code.length <= 4)
}

/** The growth stage where it is one on all lines; empty where none is written. */
export function oneStage({ content: { lines } }: SignedRecord): { stage: string | null; bbch: string | null } | null {
  const [first] = lines
  const isOne = lines.every(({ stage, bbch }) => stage === first?.stage && bbch === first.bbch)
  return first && isOne ? first : null
}

interface Context { signed: SignedRecord; words: ReportWords; showsHolds: boolean; isMany: boolean; hasOneStage: boolean }

function columns(say: ReportWords['say'], { showsHolds }: Context, { width, isNarrow }: { width: number; isNarrow: boolean }): Column[] {
  const fixed: Column[] = [
    { head: say('lines.hectares'), width: isNarrow ? 41 : 44, align: 'right' },
    { head: say('lines.start'), width: isNarrow ? 38 : 44, align: 'right', opensAccount: true },
    { head: say('lines.end'), width: isNarrow ? 35 : 42, align: 'right' },
    { head: say('lines.amount'), width: isNarrow ? 56 : 66, align: 'right', opensAccount: true },
    { head: say('lines.known'), width: isNarrow ? 56 : 62 },
    ...(showsHolds ? [{ head: say('lines.keepOut'), width: 70 }, { head: say('lines.doNotPick'), width: 66 }] : []),
  ]
  const used = fixed.reduce((sum, column) => sum + column.width, 0)
  return [{ head: say('lines.block'), width: width - used }, ...fixed]
}

function nameOf({ line, block }: PairedLine, { words, isMany, hasOneStage }: Context): Span[] {
  const part = partWords(line.part, words)
  const details = [
    ...(isMany ? [block.crop ?? words.say('facts.noCrop'), words.say('lines.boundaryVersion', { version: block.version })] : []),
    lineCountWords(line, words),
    hasOneStage ? '' : stageWords(line, words),
  ].filter((detail) => detail !== '')
  return [
    ...bold(block.code),
    ...plain(isMany ? ` ${block.name}, ${part}` : ` ${part}`),
    ...(details.length === 0 ? [] : [{ text: `\n${details.join('; ')}`, style: STYLES.small }]),
  ]
}

function totalName({ content, computed }: SignedRecord, words: ReportWords): Span[] {
  const isDrawn = content.lines.every(({ part }) => !isCounted(part))
  const counts = countWords(computed.counts, words)
  const name = bold(words.say(isDrawn ? 'lines.total' : 'lines.totalCounted'))
  return counts === '' ? name : [...name, { text: `\n${counts}`, style: STYLES.small }]
}

function areaColumn(pairs: readonly PairedLine[], { computed }: SignedRecord, words: ReportWords): { cells: string[]; total: string; addsUp: boolean } {
  const inHa = (areaM2: string | number) => ({ value: words.inHectares(areaM2), digits: words.hectareDigits(areaM2), most: 4 })
  const extra = extraDigits(pairs.map(({ areaM2 }) => inHa(areaM2)), inHa(computed.areaM2))
  return {
    cells: pairs.map(({ areaM2 }) => words.hectares(areaM2, extra ?? 0)),
    total: words.hectares(computed.areaM2),
    addsUp: extra !== null,
  }
}

interface AmountCell { text: string; known: string }

/** What went on each line as written down, else its share of the mix; the total where every line says one in the same measure. */
function amountColumn(pairs: readonly PairedLine[], { sheet, agrees }: RecordFigures, words: ReportWords): { cells: AmountCell[]; total: string; addsUp: boolean } {
  const { say } = words
  const unit = sheet.appliedL === null ? 'kg' : 'L'
  const total = sheet.appliedL ?? sheet.appliedKg
  const isOneUnit = pairs.every(({ line }) => line.amount?.unit === unit)
  const extra = total === null || !isOneUnit ? 0 : extraDigits(
    pairs.map(({ line: { amount } }) => ({ value: amount?.value ?? '0', digits: amount?.known === 'workedOut' ? words.digits(amount.value) : null })),
    { value: total, digits: words.digits(total) },
  )
  const cells = pairs.map(({ line: { amount }, signed }, index): AmountCell => {
    if (amount) {
      // What was worked out is the share of the mix, written out at signing: rounded for reading like every such figure.
      const text = amount.known === 'workedOut' ? words.worked(amount.value, amount.unit, extra ?? 0) : words.quantity(amount.value, amount.unit)
      return { text, known: say(`known.${amount.known}`) }
    }
    const share = signed ?? (agrees ? sheet.lines[index] : null)
    if (share?.shareL != null) return { text: words.worked(share.shareL, 'L'), known: say('known.workedOut') }
    if (share?.shareKg != null) return { text: words.worked(share.shareKg, 'kg'), known: say('known.workedOut') }
    return { text: say('lines.none'), known: say('lines.none') }
  })
  return { cells, total: total === null ? '' : words.worked(total, unit), addsUp: extra !== null }
}

function holdCells({ line, signed }: PairedLine, words: ReportWords): Span[][] {
  const none = words.say('lines.none')
  const { reEntryUntil = null, pickFrom = null } = signed ?? {}
  const isSameDay = reEntryUntil !== null && line.endedAt !== null && words.isSameDay(reEntryUntil, line.endedAt)
  return [
    plain(reEntryUntil === null ? none : isSameDay ? words.time(reEntryUntil) : words.moment(reEntryUntil)),
    plain(pickFrom === null ? none : words.civilDay(pickFrom)),
  ]
}

function lineTime(instant: string | null, { times }: SignedRecord, words: ReportWords): string {
  if (instant === null) return words.say('lines.none')
  if (words.isSameDay(instant, times.startedAt)) return words.time(instant)
  return words.say('lines.nextDay', { time: words.time(instant), day: words.day(instant) })
}
