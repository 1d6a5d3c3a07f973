import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { Column, Table, TableRow } from '../parts/ledgerTable.ts'
import { STYLES } from '../parts/styles.ts'
import type { Span } from '../parts/wrapText.ts'
import type { RecordFigures } from './recordFigures.ts'
import { bold, plain, type ReportWords } from './reportWords.ts'

type Block = SignedRecord['blocks'][number]
type BlockLine = SignedRecord['content']['lines'][number]

/** More lines than this stand in a table of their own under the plan. */
export const LINES_BESIDE_PLAN = 6

/** Each block line with the block as it was when the record was signed. */
export function pairBlocks({ content, blocks }: SignedRecord): { line: BlockLine; block: Block }[] {
  return content.lines.map((line) => {
    const block = blocks.find(({ id }) => id === line.blockId)
    if (!block) throw new RangeError(`the record does not hold block ${line.blockId}`)
    return { line, block }
  })
}

interface LinesInput { signed: SignedRecord; figures: RecordFigures; words: ReportWords; isWide: boolean; place: { x: number; width: number } }

/** The table of block lines; wide, it names crop and boundary of each. */
export function blockLinesTable({ signed, figures, words, isWide, place }: LinesInput): Table {
  const { say } = words
  const pairs = pairBlocks(signed)
  const rows: TableRow[] = pairs.map(({ line, block }, index) => {
    const { litres, known } = lineAmount(line, { figures, index, words })
    return {
      hasHead: true,
      cells: [
        nameOf(block, { words, isWide }),
        ...(isWide ? [plain(block.crop ?? say('lines.none')), plain(say('facts.boundary', { code: '', version: block.version }).trim())] : []),
        plain(words.hectares(block.areaM2)),
        plain(lineTime(line.startedAt, signed, words)),
        plain(lineTime(line.endedAt, signed, words)),
        plain(litres),
        plain(known),
      ],
    }
  })
  rows.push({
    isTotal: true, hasHead: true,
    cells: [
      bold(say('lines.total')), ...(isWide ? [[], []] : []),
      bold(words.hectares(signed.computed.areaM2)), [], [],
      figures.sheet.appliedL === null ? [] : bold(words.amount(figures.sheet.appliedL)), [],
    ],
  })
  const last = rows.at(-2)
  if (last) last.keepsWithNext = true
  return { x: place.x, columns: columns({ words, isWide, width: place.width }), rows, leading: STYLES.body.leading, padding: 2.4, showsHeads: true }
}

function columns({ words: { say }, isWide, width }: { words: ReportWords; isWide: boolean; width: number }): Column[] {
  const fixed: Column[] = [
    { head: say('lines.hectares'), width: isWide ? 46 : 42, align: 'right' },
    { head: say('lines.start'), width: isWide ? 48 : 38, align: 'right', opensAccount: true },
    { head: say('lines.end'), width: isWide ? 46 : 36, align: 'right' },
    { head: say('lines.litres'), width: isWide ? 68 : 50, align: 'right', opensAccount: true },
    { head: say('lines.known'), width: 60 },
  ]
  const extra: Column[] = isWide ? [{ head: say('facts.crop'), width: 92 }, { head: say('lines.boundary'), width: 50 }] : []
  const used = [...fixed, ...extra].reduce((sum, column) => sum + column.width, 0)
  return [{ head: say('lines.block'), width: width - used }, ...extra, ...fixed]
}

function nameOf({ code, name }: Block, { words, isWide }: { words: ReportWords; isWide: boolean }): Span[] {
  return [...bold(code), ...plain(` ${isWide ? name : words.say('lines.whole')}`)]
}

/** What went on the block: as written down, else its share of the mix. */
function lineAmount(
  { amount }: BlockLine, { figures, index, words }: { figures: RecordFigures; index: number; words: ReportWords },
): { litres: string; known: string } {
  const { say } = words
  const line = figures.sheet.lines[index]
  if (amount) {
    // What was worked out is the share of the mix, written out at signing: rounded for reading like every such figure.
    const value = amount.known === 'workedOut' ? words.amount(amount.value) : words.typed(amount.value)
    const withUnit = amount.known === 'workedOut' ? words.worked(amount.value, amount.unit) : words.quantity(amount.value, amount.unit)
    const litres = amount.unit === 'L' ? value : withUnit
    return { litres, known: say(`known.${amount.known}`) }
  }
  if (!figures.agrees || !line?.shareL) return { litres: say('lines.none'), known: say('lines.none') }
  return { litres: words.amount(line.shareL), known: say('known.workedOut') }
}

function lineTime(instant: string | null, { times }: SignedRecord, words: ReportWords): string {
  if (instant === null) return words.say('lines.none')
  if (words.isSameDay(instant, times.startedAt)) return words.time(instant)
  return words.say('lines.nextDay', { time: words.time(instant), day: words.day(instant) })
}
