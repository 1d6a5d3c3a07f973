import { ExactDecimal } from '../../../shared/units/exactDecimal.ts'
import type { Element } from '../parts/canvas.ts'
import { drawLedgerTable, type Table } from '../parts/ledgerTable.ts'
import { turnTo, type Flow } from '../parts/pageFlow.ts'
import { drawParagraph } from '../parts/paragraph.ts'
import { STYLES } from '../parts/styles.ts'
import type { SeasonReportData } from '../seasonReportData.ts'
import { drawSeasonTitle } from './seasonCover.ts'
import type { SeasonWords } from './seasonWords.ts'
import { summaryTable } from './summaryTable.ts'

/** The summary by block on pages of its own: the table, the shares each of how many, how to read them. */
export function drawSummary(flow: Flow, part: Element, data: SeasonReportData, words: SeasonWords): void {
  const { figures: { first, last, from, to, signed }, blocks } = data
  const { say, day } = words
  turnTo(flow, { isLying: false })
  const beside = [
    ...(from === null || to === null ? [] : [say('span', { from: day(from), to: day(to) })]),
    ...(first === null || last === null ? [] : [say('numbers', { first, last })]),
  ]
  drawSeasonTitle(flow, part, say('summary'), beside)
  const { table, addsUp } = summaryTable(flow.canvas, data, words)
  drawLedgerTable(flow, part, table)
  flow.y += 12
  drawLedgerTable(flow, part, sharesTable(flow, data, words))
  flow.y += 8
  const passes = blocks.reduce((sum, { foliar, drench, solid }) => sum + foliar + drench + solid, 0)
  const notes = [
    say('notes.passes', { passes: words.count(passes), signed: words.count(signed) }), say('notes.areas'), say('notes.left'), say('notes.withdrawn'), say('notes.unknown'),
    ...(addsUp ? [] : [say('notes.rounded')]),
  ]
  for (const note of notes) {
    drawParagraph(flow, part, note, STYLES.note)
    flow.y += 2
  }
}

function sharesTable({ canvas }: Flow, { figures }: SeasonReportData, { say, count, figure }: SeasonWords): Table {
  const of = (part: number) => say('shares.of', { count: count(part), all: count(figures.signed) })
  const litres = new ExactDecimal(figures.litres)
  const measured = litres.isZero() ? say('shares.none') : say('shares.percent', { percent: figure(new ExactDecimal(figures.litresMeasured).div(litres).times(100).toFixed(), 0), litres: figure(figures.litres, 0) })
  const shares: [string, string][] = [
    ['stops', of(figures.stops)], ['late', of(figures.late)], ['veryLate', of(figures.veryLate)], ['measured', measured], ['unknown', of(figures.unknown)],
  ]
  return {
    x: canvas.frame.left, leading: STYLES.method.leading, padding: 3, showsHeads: true,
    columns: shares.map(([name]) => ({ head: say(`shares.${name}`), width: canvas.frame.width / shares.length })),
    rows: [{ cells: shares.map(([, text]) => [{ text, style: STYLES.bodyBold }]) }],
  }
}
