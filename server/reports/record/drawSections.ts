import { drawBlockPlan, planHeight } from '../parts/blockPlan.ts'
import { addElement, type Canvas, type Element } from '../parts/canvas.ts'
import { drawRule } from '../parts/drawRules.ts'
import { drawFacts, factsHeight, type FactsBox } from '../parts/factsList.ts'
import { drawLedgerTable, ledgerTableHeight, type Table } from '../parts/ledgerTable.ts'
import { ensureRoom, FRAME, FRAME_WIDTH, roomLeft, turnPage, type Flow } from '../parts/pageFlow.ts'
import { drawSectionHead, sectionHeadHeight } from '../parts/sectionHead.ts'
import { RULES, STYLES } from '../parts/styles.ts'
import { drawLines, wrapText, type Line, type Span } from '../parts/wrapText.ts'
import type { RecordReportData } from '../recordReportData.ts'
import { blockLinesTable, fitsBesidePlan } from './blockLines.ts'
import { checksTable, checksTally } from './checksTable.ts'
import { entryNotices } from './entryNotices.ts'
import { filesTable } from './filesTable.ts'
import { mixTable } from './mixTable.ts'
import { mixAside } from './mixWords.ts'
import { peopleFacts } from './peopleFacts.ts'
import { placeFacts } from './placeFacts.ts'
import { planOf } from './planOf.ts'
import { reasonsTable } from './reasonsTable.ts'
import type { RecordFigures } from './recordFigures.ts'
import { plain, type ReportWords } from './reportWords.ts'
import { weatherFacts } from './weatherFacts.ts'
import { PLAIN_FIELDS } from '../../../shared/records/plainFields.ts'

/** What the parts of the record's PDF are drawn from and into. */
export interface Page {
  canvas: Canvas
  flow: Flow
  part: Element
  data: RecordReportData
  words: ReportWords
  figures: RecordFigures
}

const PLAN = { width: 207, height: 151.5 }
const GAP = 18
const WHOLE = { x: FRAME.left, width: FRAME_WIDTH }

/** Why this version was made, what it replaces, and what replaced it; nothing for the first one that still stands. */
export function drawNotices(page: Page): void {
  const { canvas, flow, data, words } = page
  const notices = entryNotices(data, words)
  if (notices.length === 0) return
  for (const notice of notices) drawParagraph(page, notice)
  flow.y += 4
  drawRule(canvas, { x: FRAME.left, y: flow.y, width: FRAME_WIDTH }, 0.4, RULES.ink)
  flow.y += 6
}

/** Facts at the left, the plan at the right, the block lines under the facts or, where they say more, under both. */
export function drawPlace(page: Page): void {
  const { canvas, flow, part, data, words, figures } = page
  const frame = { x: FRAME.right - PLAN.width, y: flow.y + 0.5, ...PLAN }
  const place = { x: FRAME.left, width: FRAME_WIDTH - PLAN.width - GAP }
  const { y: top, pages } = flow
  drawBlockPlan(canvas, part, { plan: planOf(data, words), frame })
  drawFacts(flow, part, { facts: placeFacts(data, words), box: { ...place, labelWidth: 69 } })
  const isNarrow = fitsBesidePlan(data.signed)
  const { table, addsUp } = blockLinesTable({ signed: data.signed, figures, words, isNarrow, place: isNarrow ? place : WHOLE })
  const bottom = top + planHeight(PLAN.height)
  if (isNarrow) {
    flow.y += 4
    drawLedgerTable(flow, part, table)
  }
  if (flow.pages === pages) flow.y = Math.max(flow.y, bottom)
  if (!isNarrow) {
    flow.y += 2
    drawLedgerTable(flow, part, table)
  }
  if (!addsUp) drawNote(page, words.say('lines.rounded'))
}

export function drawMix(page: Page): void {
  const { flow, part, data, words, figures } = page
  const { table, addsUp } = mixTable({ signed: data.signed, figures, words, place: WHOLE })
  startSection(page, words.say(data.signed.content.method === 'solid' ? 'mix.titleSolid' : 'mix.title'), { aside: mixAside(data.signed, words), needs: 60 })
  drawLedgerTable(flow, part, table)
  if (!addsUp) drawNote(page, words.say('lines.rounded'))
  if (!figures.agrees) drawParagraph(page, plain(words.say('mix.differs')))
}

/** Sprayer and weather at the left, people and times at the right. */
export function drawWeatherAndPeople(page: Page): void {
  const { canvas, flow, part, data, words } = page
  const left = { x: FRAME.left, width: (FRAME_WIDTH - GAP) * 0.46 }
  const right = { x: FRAME.left + left.width + GAP, width: FRAME_WIDTH - GAP - left.width }
  const halves = [
    { place: left, title: words.say('weather.title'), facts: weatherFacts(data, words), labelWidth: words.language === 'es' ? 76 : 54 },
    { place: right, title: words.say('people.title'), facts: peopleFacts(data, words), labelWidth: words.language === 'es' ? 82 : 64 },
  ].map((half) => ({ ...half, box: { ...half.place, labelWidth: half.labelWidth } satisfies FactsBox }))
  const headHeight = sectionHeadHeight(canvas, { title: '', y: 0, ...WHOLE })
  const bodyHeight = Math.max(...halves.map(({ facts, box }) => factsHeight(canvas, facts, box)))
  flow.y += SECTION_GAP
  ensureRoom(flow, headHeight + bodyHeight)
  const top = flow.y
  for (const { place, title, facts, box } of halves) {
    drawSectionHead(canvas, part, { title, y: top, ...place })
    flow.y = top + headHeight
    drawFacts(flow, part, { facts, box })
  }
  flow.y = top + headHeight + bodyHeight
}

export function drawChecks(page: Page): void {
  const { canvas, flow, part, data, words } = page
  const { checks } = data.signed
  const table = checksTable({ canvas, checks, words, place: WHOLE })
  const aside = checks.length === 0 ? words.say('checks.none') : checksTally(checks, words)
  startSection(page, words.say('checks.title'), { aside, needs: 40 })
  if (checks.length > 0) drawLedgerTable(flow, part, table)
}

/** Why it was signed although something spoke against it; nothing where no reason was asked for. */
export function drawReasons(page: Page): void {
  const { flow, part, data, words } = page
  if (data.signed.acknowledged.length === 0) return
  const table = reasonsTable(data.signed, { words, place: WHOLE })
  startSection(page, words.say('reasons.title'), { needs: firstRowsHeight(page.canvas, table) })
  drawLedgerTable(flow, part, table)
}

/** Photos and papers that were with it; nothing where there were none. */
export function drawFiles(page: Page): void {
  const { flow, part, data, words } = page
  if (data.signed.files.length === 0) return
  const table = filesTable(data.signed, { words, place: WHOLE })
  startSection(page, words.say('files.title'), { aside: words.say('files.aside'), needs: firstRowsHeight(page.canvas, table) })
  drawLedgerTable(flow, part, table)
}

/** The long plain words of the record, each under its own head. */
export function drawLongWords(page: Page): void {
  const { data, words } = page
  for (const { name } of PLAIN_FIELDS.filter(({ isLong }) => isLong)) {
    const text = data.signed.content[name]
    if (text === null) continue
    startSection(page, words.plainLabel(name), { needs: 3 * STYLES.body.leading })
    for (const paragraph of text.split(/\r\n|[\n\r\u2028\u2029]/)) drawParagraph(page, plain(paragraph))
  }
  if (page.canvas.hasReplaced) {
    page.flow.y += 6
    drawParagraph(page, plain(words.say('foot.replaced')))
  }
}

const SECTION_GAP = 9

/** Turns the page unless the head and what it `needs` under it, points, fit on this one; draws the head. */
function startSection({ canvas, flow, part }: Page, title: string, { aside = '', needs }: { aside?: string; needs: number }): void {
  flow.y += SECTION_GAP
  const head = { title, aside, ...WHOLE }
  const height = sectionHeadHeight(canvas, { ...head, y: 0 })
  ensureRoom(flow, height + needs)
  drawSectionHead(canvas, part, { ...head, y: flow.y })
  flow.y += height
}

function firstRowsHeight(canvas: Canvas, table: Table): number {
  return ledgerTableHeight(canvas, { ...table, rows: table.rows.slice(0, 1) })
}

/** Words over the whole width that run on over pages, line by line. */
function drawNote(page: Page, text: string): void {
  drawParagraph(page, [{ text, style: STYLES.note }])
}

function drawParagraph({ canvas, flow, part }: Page, spans: readonly Span[]): void {
  const { leading } = STYLES.body
  let lines = wrapText(canvas, spans, FRAME_WIDTH)
  const element = addElement(canvas, part, 'P')
  flow.y += 2
  while (lines.length > 0) {
    const fitting = Math.floor(roomLeft(flow) / leading)
    if (fitting < 1) {
      turnPage(flow)
      continue
    }
    const now: Line[] = lines.slice(0, fitting)
    const { y } = flow
    element.add(() => drawLines(canvas, now, { ...WHOLE, y, leading, align: now[0]?.fromRight ? 'right' : 'left' }))
    flow.y += now.length * leading
    lines = lines.slice(fitting)
  }
}
