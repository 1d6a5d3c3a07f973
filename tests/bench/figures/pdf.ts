import { execFileSync } from 'node:child_process'
import { Writable } from 'node:stream'
import PDFDocument from 'pdfkit'
import { renderReport } from '../../../server/reports/renderReport.ts'
import { buildPrintedRow, buildRegisterReportData } from '../../support/buildRegisterReportData.ts'
import { drawBare, type SetWords } from '../baselines/barePdf.ts'
import { assertSame, measureRounds } from '../measureRounds.ts'
import type { Summary } from '../statistics.ts'
import type { Effort } from './overHttp.ts'

/** Records of one volume: about forty pages. */
const RECORDS = 600
/** Volumes drawn one after the other, of which the last may need no more room than the first. */
const VOLUMES = 4

const nowhere = (): Writable => new Writable({ write(_chunk, _encoding, done) { done() } })

/** One volume of the register. */
export function drawVolume(volume: number): Promise<void> {
  const rows = Array.from({ length: RECORDS }, (_, turn) => buildPrintedRow((volume - 1) * RECORDS + turn))
  return renderReport({ kind: 'register', data: buildRegisterReportData({ rows, volume, volumes: VOLUMES }) }, nowhere())
}

/** Pages a second of a register volume, beside the same words set by the library alone. */
export async function measurePdf({ rounds }: Effort): Promise<Summary> {
  const words = await recordWords(() => drawVolume(1))
  assertSame('pdf', await recordWords(() => drawBare(words, nowhere())), words)
  const pages = Math.max(...words.map(({ page }) => page)) + 1
  const repeat = (draw: () => Promise<void>) => async (times: number): Promise<void> => { for (let turn = 0; turn < times; turn++) await draw() }
  return measureRounds({
    ours: repeat(() => drawVolume(1)), baseline: repeat(() => drawBare(words, nowhere())), times: 1, rounds, read: (ms) => pages / (ms / 1000),
  })
}

/** Most memory a process takes that draws all volumes one after the other, beside one that draws the first alone, MB. */
export function measurePdfMemory(): { ours: number; baseline: number } {
  return { ours: peakOf(VOLUMES), baseline: peakOf(1) }
}

function peakOf(volumes: number): number {
  return Number(execFileSync(process.execPath, ['--expose-gc', '--import', 'tsx', 'tests/bench/drawVolumes.ts', String(volumes)], { encoding: 'utf8' }))
}

/** What a drawing sets, word for word; pages are counted from 0. */
async function recordWords(draw: () => Promise<void>): Promise<SetWords[]> {
  const words: SetWords[] = []
  const { text: setText, font, fontSize, fillColor, addPage, switchToPage } = PDFDocument.prototype
  let [pages, page, face, size, color] = [0, 0, '', 0, '']
  Object.assign(PDFDocument.prototype, {
    addPage(this: PDFKit.PDFDocument, ...all: Parameters<typeof addPage>) { page = pages++; return addPage.apply(this, all) },
    switchToPage(this: PDFKit.PDFDocument, to: number) { page = to; return switchToPage.call(this, to) },
    font(this: PDFKit.PDFDocument, name: string) { face = name; return font.call(this, name) },
    fontSize(this: PDFKit.PDFDocument, points: number) { size = points; return fontSize.call(this, points) },
    fillColor(this: PDFKit.PDFDocument, given: string) { color = given; return fillColor.call(this, given) },
    text(this: PDFKit.PDFDocument, text: string, x: number, y: number, options: PDFKit.Mixins.TextOptions) {
      words.push({ page, text, x, y, face, size, color })
      return setText.call(this, text, x, y, options)
    },
  })
  try {
    await draw()
  } finally {
    Object.assign(PDFDocument.prototype, { text: setText, font, fontSize, fillColor, addPage, switchToPage })
  }
  return words
}
