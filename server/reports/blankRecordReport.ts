import type { Writable } from 'node:stream'
import { EACH } from '../../shared/contract/each.ts'
import { METHODS, PROTECTION } from '../../shared/contract/recordContent.ts'
import { WEATHER_KINDS } from '../../shared/contract/weather.ts'
import { PLAIN_FIELDS } from '../../shared/records/plainFields.ts'
import type { Language } from '../../shared/messages/translate.ts'
import { drawWriteLines, type WriteLine } from './parts/writeLines.ts'
import { addElement, drawArtifact, openCanvas, type Canvas } from './parts/canvas.ts'
import { drawMethodMark } from './parts/drawMarks.ts'
import { drawDoubleRule } from './parts/drawRules.ts'
import { drawLedgerTable, type Column, type TableRow } from './parts/ledgerTable.ts'
import { FRAME, FRAME_WIDTH, startFlow, type Flow } from './parts/pageFlow.ts'
import { drawRunningHead } from './parts/runningHead.ts'
import { drawSectionHead, sectionHeadHeight } from './parts/sectionHead.ts'
import { drawText, measureText } from './parts/setText.ts'
import { STYLES } from './parts/styles.ts'
import { drawTicks } from './parts/tickBoxes.ts'
import { drawLines, wrapText } from './parts/wrapText.ts'
import { openWords, plain, type ReportWords } from './record/reportWords.ts'

/** All that the blank record form shows. */
export interface BlankRecordData {
  farm: { name: string; zone: string }
  /** RFC 3339 instant. */
  printedAt: string
  language: Language
}

interface Page { canvas: Canvas; flow: Flow; part: ReturnType<typeof addElement>; words: ReportWords }

const LINE_ROWS = 7
const MIX_ROWS = 4
/** White over and under the words of a row that is written in by hand, points. */
const HAND = 4.6

/** Draws the blank record form, one page, into a stream: the fields of a record for paper in the rows. */
export function blankRecordReport({ farm, printedAt, language }: BlankRecordData, stream: Writable): void {
  const words = openWords(language, farm.zone)
  const canvas = openCanvas({ title: words.say('blank.title'), subject: farm.name, keywords: '', createdAt: printedAt, language }, stream)
  const flow = startFlow(canvas, { first: 26, later: 26 })
  const page: Page = { canvas, flow, words, part: addElement(canvas, canvas.root, 'Sect') }
  drawHead(page)
  drawWriteLines(flow, page.part, [...fieldsOf(words, ['day', 'crop', 'stage']), ...plainLines(words, 'ready'), ...fieldsOf(words, ['sprayer', 'workedIn'])])
  drawBlocks(page)
  drawMix(page)
  drawWeather(page)
  drawPeople(page)
  drawFrame(page, { farm: farm.name, printed: words.say('foot.printed', { moment: words.moment(printedAt) }) })
  canvas.doc.end()
}

function drawHead({ canvas, flow, part, words }: Page): void {
  const { say } = words
  addElement(canvas, part, 'H1', () => drawText(canvas, say('blank.title'), { x: FRAME.left, y: flow.y }, { ...STYLES.stamp, size: 22, leading: 26 }))
  const number = say('blank.number')
  addElement(canvas, part, 'P', () => drawText(canvas, number, { x: FRAME.right - measureText(canvas, number, STYLES.body), y: flow.y + 12 }, STYLES.body))
  flow.y += 30
  flow.y += drawDoubleRule(canvas, { x: FRAME.left, y: flow.y, width: FRAME_WIDTH }, [2.2, 0.6]) + 6
  drawTicks(flow, part, {
    label: say('blank.method'),
    ticks: METHODS.map((method) => ({ word: say(`stamp.${method}`), mark: (at) => drawMethodMark(canvas, method, { ...at, size: 9 }) })),
  })
}

function fieldsOf({ say }: ReportWords, names: readonly string[]): WriteLine[] {
  return names.map((name) => ({ label: say(`blank.${name}`) }))
}

/** The plain fields of a record as lines to write on; a long one takes the whole width. */
function plainLines(words: ReportWords, step: (typeof PLAIN_FIELDS)[number]['step']): WriteLine[] {
  return PLAIN_FIELDS.filter((field) => field.step === step).map(({ name, isLong }) => ({ label: words.plainLabel(name), isWide: isLong }))
}

function drawBlocks(page: Page): void {
  const { words: { say, join } } = page
  const counts = join(EACH.map((each) => say(`blank.each.${each}`)))
  startSection(page, say('facts.blocks'), say('blank.partHint', { counts }))
  const columns: Column[] = [
    { head: say('lines.block'), width: 62 }, { head: say('blank.part'), width: FRAME_WIDTH - 62 - 96 - 50 - 50 - 70 - 62 }, { head: say('blank.counts'), width: 96 },
    { head: say('lines.start'), width: 50, opensAccount: true }, { head: say('lines.end'), width: 50 },
    { head: say('lines.amount'), width: 70, opensAccount: true }, { head: say('lines.known'), width: 62 },
  ]
  drawEmptyTable(page, columns, emptyRows(LINE_ROWS, columns.length))
}

function drawMix(page: Page): void {
  const { words: { say } } = page
  startSection(page, say('mix.title'), say('blank.mixHint'))
  const columns: Column[] = [
    { head: say('mix.ingredient'), width: FRAME_WIDTH - 96 - 96 - 84 - 84 }, { head: say('mix.lot'), width: 96 }, { head: say('mix.measure'), width: 96 },
    { head: say('mix.inAll'), width: 84, opensAccount: true }, { head: say('blank.used'), width: 84 },
  ]
  const water: TableRow = { hasHead: true, cells: [plain(say('mix.water')), [], [], [], []] }
  drawEmptyTable(page, columns, [water, ...emptyRows(MIX_ROWS, columns.length)])
}

function drawWeather(page: Page): void {
  const { flow, part, words: { say } } = page
  startSection(page, say('blank.weather'), say('blank.weatherHint'))
  for (const name of ['wind', 'air', 'humidity'] as const) {
    const ticks = WEATHER_KINDS.filter((kind) => kind !== 'model').map((kind) => ({ word: say(`weather.${kind}`) }))
    drawTicks(flow, part, { label: say(`weather.${name}`), room: name === 'wind' ? say('blank.windFrom') : '', ticks })
  }
}

function drawPeople(page: Page): void {
  const { canvas, flow, part, words } = page
  const { say } = words
  startSection(page, say('people.title'), '')
  drawTicks(flow, part, { label: say('people.worn'), ticks: PROTECTION.map((item) => ({ word: say(`protection.${item}`) })) })
  drawWriteLines(flow, part, [...fieldsOf(words, ['doneBy', 'writtenOn', 'enteredBy']), ...plainLines(words, 'happened'), { label: '', isWide: true }])
  const lines = wrapText(canvas, [{ text: say('blank.caution'), style: STYLES.note }], FRAME_WIDTH)
  const { y } = flow
  addElement(canvas, part, 'P', () => drawLines(canvas, lines, { x: FRAME.left, y: y + 4, width: FRAME_WIDTH, leading: STYLES.note.leading }))
}

function startSection({ canvas, flow, part }: Page, title: string, aside: string): void {
  flow.y += 7
  const head = { title, aside, x: FRAME.left, width: FRAME_WIDTH }
  drawSectionHead(canvas, part, { ...head, y: flow.y })
  flow.y += sectionHeadHeight(canvas, { ...head, y: flow.y })
}

function emptyRows(count: number, columns: number): TableRow[] {
  return Array.from({ length: count }, () => ({ cells: Array.from({ length: columns }, () => []) }))
}

function drawEmptyTable({ flow, part }: Page, columns: Column[], rows: TableRow[]): void {
  drawLedgerTable(flow, part, { x: FRAME.left, columns, rows, leading: STYLES.body.leading, padding: HAND, showsHeads: true })
}

function drawFrame({ canvas, words }: Page, { farm, printed }: { farm: string; printed: string }): void {
  drawRunningHead(canvas, { farm, register: words.say('blank.register'), document: words.say('blank.title') })
  const y = FRAME.bottom - STYLES.running.leading
  drawArtifact(canvas, () => drawText(canvas, printed, { x: FRAME.right - measureText(canvas, printed, STYLES.running), y }, STYLES.running), 'Pagination')
}
