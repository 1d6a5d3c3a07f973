import { formatDayShort } from '../../../shared/messages/formatDayShort.ts'
import { extraDigits } from '../../../shared/units/extraDigits.ts'
import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import type { Canvas } from '../parts/canvas.ts'
import type { Column, Table, TableRow } from '../parts/ledgerTable.ts'
import { drawMethodMark } from '../parts/drawMarks.ts'
import { drawText, measureText } from '../parts/setText.ts'
import { STYLES } from '../parts/styles.ts'
import type { SeasonReportData, SummaryBlock } from '../seasonReportData.ts'
import type { SeasonWords } from './seasonWords.ts'
import { drawBlockGlyph, drawSeasonStrip, drawStripMonths } from './seasonStripMark.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

const LEADING = 12
const GLYPH = 17
const regular = { ...STYLES.small, leading: LEADING }
const bold = { ...regular, weight: 'bold' } as const

/** One figure column: its words, its width, what a block has in it, and how it is printed. */
interface Figure { name: string; width: number; of: (block: SummaryBlock) => string | null; digits: number }

/** The table of the summary, and whether its printed figures add up to the printed totals. */
export interface SummaryTable { table: Table; addsUp: boolean }

/** What each block got, its season as a strip, and the totals of all. */
export function summaryTable(canvas: Canvas, data: SeasonReportData, words: SeasonWords): SummaryTable {
  const { blocks, figures: { from, to } } = data
  const span = { from: from ?? data.span.from, to: to ?? data.span.to }
  const short = (day: string) => formatDayShort(data.language, day)
  const figures = figureColumns(blocks)
  const stripWidth = canvas.frame.width - 104 - figures.reduce((sum, { width }) => sum + width, 0) - 48
  const stripX = 104 + figures.reduce((sum, { width }) => sum + width, 0) + 6
  const columns: Column[] = [
    { head: words.say('column.block'), width: 104, indent: GLYPH + 6 },
    ...figures.map(({ name, width }, index): Column => ({ head: words.say(`column.${name}`), width, align: 'right', ...(index === 0 && { opensAccount: true }) })),
    {
      head: words.say('column.strip', { from: short(span.from), to: short(span.to) }), width: stripWidth,
      drawHead: ({ y }) => drawStripMonths(canvas, span, { x: canvas.frame.left + stripX, y, width: stripWidth - 12 }, (day) => short(day).replace(/[\d\s.]/g, '')),
    },
    { head: words.say('column.last'), width: 48, align: 'right' },
  ]
  const set = figures.map((figure) => setColumn(blocks, figure, words))
  const rows = blocks.map((block, index): TableRow => ({
    hasHead: true,
    cells: [
      [{ text: block.blockId === '' ? words.say('notShared') : block.code, style: bold }, { text: block.crop === null ? '' : `  ${block.crop.split(',')[0] ?? ''}`, style: regular }],
      ...set.map(({ cells }) => [{ text: cells[index] ?? '', style: regular }]),
      [],
      [{ text: block.lastOn === null ? '' : short(block.lastOn), style: regular }],
    ],
    mark: { column: 0, draw: ({ x, y }) => {
      if (block.geometry) drawBlockGlyph(canvas, block.geometry, { x, y: y - 1, width: GLYPH, height: LEADING + 2 })
      drawSeasonStrip(canvas, block.marks, span, { x: x + stripX, y, width: stripWidth - 12, height: LEADING })
    } },
  }))
  const total: TableRow = {
    isTotal: true, hasHead: true,
    cells: [[{ text: words.say('total', { count: words.count(blocks.length) }, blocks.length), style: bold }], ...set.map(({ sum }) => [{ text: sum, style: bold }]), [], []],
    mark: { column: 0, draw: ({ x, y }) => drawLegend(canvas, words, { x: x + stripX, y }) },
  }
  return { addsUp: set.every(({ addsUp }) => addsUp), table: { x: canvas.frame.left, leading: LEADING, padding: 3.4, showsHeads: true, columns, rows: [...rows, total] } }
}

/** What the marks of the strip mean, for readers by eye; the columns say it to everybody. */
function drawLegend(canvas: Canvas, words: SeasonWords, at: { x: number; y: number }): void {
  let { x } = at
  for (const method of ['foliar', 'drench'] as const) {
    const text = words.say(`method.${method}`)
    drawMethodMark(canvas, method, { x, y: at.y + 3, size: 6 })
    drawText(canvas, text, { x: x + 9, y: at.y }, regular)
    x += 9 + measureText(canvas, text, regular) + 10
  }
}

/** Columns that have anything in them; area and passes always. */
function figureColumns(blocks: readonly SummaryBlock[]): Figure[] {
  const all: (Figure & { isAlways?: boolean })[] = [
    { name: 'areaHa', width: 42, of: ({ areaM2 }) => areaM2 && new ExactDecimal(areaM2).div(M2_PER_HA).toFixed(), digits: 2, isAlways: true },
    { name: 'foliar', width: 38, of: ({ foliar }) => nothingOr(foliar), digits: 0, isAlways: true },
    { name: 'drench', width: 40, of: ({ drench }) => nothingOr(drench), digits: 0, isAlways: true },
    { name: 'solid', width: 36, of: ({ solid }) => nothingOr(solid), digits: 0 },
    { name: 'passedHa', width: 48, of: ({ areaHa }) => areaHa, digits: 2, isAlways: true },
    { name: 'litres', width: 50, of: ({ litres }) => (/[1-9]/.test(litres) ? litres : null), digits: 0, isAlways: true },
    { name: 'kg', width: 44, of: ({ kg }) => (/[1-9]/.test(kg) ? kg : null), digits: 0 },
  ]
  return all.filter(({ of, isAlways }) => isAlways === true || blocks.some((block) => of(block) !== null))
}

const nothingOr = (count: number): string | null => (count === 0 ? null : String(count))

/** The cells of a figure column with as many decimals as its total needs to be the sum of what is printed. */
function setColumn(blocks: readonly SummaryBlock[], { of, digits }: Figure, { figure }: SeasonWords): { cells: string[]; sum: string; addsUp: boolean } {
  const values = blocks.map(of)
  const known = values.filter((value) => value !== null)
  const sum = known.reduce((all, value) => all.plus(value), new ExactDecimal(0)).toFixed()
  const extra = extraDigits(known.map((value) => ({ value, digits })), { value: sum, digits })
  return {
    cells: values.map((value) => (value === null ? '' : figure(value, digits + (extra ?? 0)))),
    sum: figure(sum, digits), addsUp: extra !== null,
  }
}
