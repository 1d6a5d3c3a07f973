import type { Writable } from 'node:stream'
import { formatCheckCode } from '../../shared/evidence/checkCode.ts'
import { addElement, openCanvas, type Canvas } from './parts/canvas.ts'
import { certificateLine, workDays } from './parts/certificateLine.ts'
import { drawFirstFoot, drawLaterFoot, footHeights, type PageFoot } from './parts/pageFoot.ts'
import { startFlow, type Flow } from './parts/pageFlow.ts'
import { drawRunningHead, headHeight, type RunningHead } from './parts/runningHead.ts'
import { drawStampHead, type StampHead } from './parts/stampHead.ts'
import { drawChecks, drawFiles, drawLongWords, drawMix, drawNotices, drawPlace, drawReasons, drawWeatherAndPeople, type Page } from './record/drawSections.ts'
import { recordFigures } from './record/recordFigures.ts'
import { openWords, type ReportWords } from './record/reportWords.ts'
import type { RecordReportData } from './recordReportData.ts'

/** Draws the PDF of one record into a stream. The same data gives the same bytes. */
export function recordReport(data: RecordReportData, stream: Writable): void {
  const words = openWords(data.language, data.signed.farm.zone)
  const code = formatCheckCode(data.digest)
  const canvas = openCanvas({
    title: words.say('running.record', { number: data.signed.record.number }),
    subject: `${words.say('foot.code')} ${code}`,
    keywords: data.digest,
    createdAt: data.printedAt,
    language: data.language,
  }, stream)
  const foot = recordFoot(data)
  const head = recordHead(data)
  const flow = startFlow(canvas, footHeights(canvas, foot), headHeight(canvas, head))
  drawRecord(flow, data)
  drawFrames(canvas, { head, foot, pages: flow.pages })
  canvas.doc.end()
}

/** Draws the record from where the flow stands. */
export function drawRecord(flow: Flow, data: RecordReportData): void {
  const { canvas } = flow
  const words = openWords(data.language, data.signed.farm.zone)
  const part = addElement(canvas, canvas.root, 'Sect')
  const page: Page = { canvas, flow, part, data, words, figures: recordFigures(data.signed) }
  drawStampHead(flow, part, stampOf(data, words))
  drawNotices(page)
  drawPlace(page)
  drawMix(page)
  drawWeatherAndPeople(page)
  drawChecks(page)
  drawReasons(page)
  drawFiles(page)
  drawLongWords(page)
}

/** Running heads and feet, drawn last because only then the number of pages is known. */
function drawFrames(canvas: Canvas, { head, foot, pages }: { head: RunningHead; foot: PageFoot; pages: number }): void {
  const part = addElement(canvas, canvas.root, 'Sect')
  for (let page = 1; page <= pages; page += 1) {
    canvas.doc.switchToPage(page - 1)
    drawRunningHead(canvas, head)
    if (page === 1) drawFirstFoot(canvas, part, { foot, pages })
    else drawLaterFoot(canvas, { foot, page, pages })
  }
}

/** What stands at the head of each of its pages. */
export function recordHead({ signed, state, language, certificates, printedAt }: RecordReportData): RunningHead {
  const { say } = openWords(language, signed.farm.zone)
  const { number, version, season } = signed.record
  const document = version === 1 ? say('running.record', { number }) : say('running.recordVersion', { number, version })
  return {
    farm: signed.farm.name,
    register: say('running.register', { season }),
    document: state === 'withdrawn' ? say('running.withdrawn', { document }) : document,
    certificate: certificateLine({ certificates, farm: signed.farm, language, printedAt }, workDays(signed.farm.zone, [signed.times.startedAt, signed.times.endedAt])),
  }
}

function stampOf({ signed, state }: RecordReportData, words: ReportWords): StampHead {
  const { say } = words
  const { record: { number, version }, times, content: { method } } = signed
  const cut = number.lastIndexOf('-') + 1
  const params = { day: words.day(times.startedAt, { weekday: true }), start: words.time(times.startedAt), end: words.time(times.endedAt) }
  return {
    year: number.slice(0, cut),
    number: number.slice(cut),
    spoken: say('running.record', { number }),
    version: version === 1 ? '' : say('stamp.version', { version }),
    withdrawn: state === 'withdrawn' ? say('stamp.withdrawn') : '',
    method: { kind: method, word: say(`stamp.${method}`) },
    when: words.isSameDay(times.startedAt, times.endedAt)
      ? say('stamp.sameDay', params)
      : say('stamp.days', { ...params, endDay: words.day(times.endedAt) }),
  }
}

/** What stands at their foot. */
export function recordFoot(data: RecordReportData): PageFoot {
  const words = openWords(data.language, data.signed.farm.zone)
  const code = formatCheckCode(data.digest)
  const { say } = words
  const runBy = data.runBy === 'farm' ? say('foot.runByFarm') : say('foot.runByOther', { name: data.runBy })
  const seq = words.short(String(data.signed.record.seq))
  return {
    checkUrl: data.checkUrl,
    codeLabel: say('foot.code'),
    codeText: say('foot.codeText', { code, seq, page: data.checkPage }),
    codeShort: say('foot.codeShort', { code, seq }),
    shows: say('foot.shows', { runBy }),
    qrAlt: say('foot.qrAlt', { url: data.checkUrl }),
    printed: say('foot.printed', { moment: words.moment(data.printedAt) }),
    pageWord: (page, pages) => say('running.page', { page, pages }),
  }
}
