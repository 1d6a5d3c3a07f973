import { create } from 'qrcode'
import { addElement, drawArtifact, type Canvas, type Element } from './canvas.ts'
import { drawRule } from './drawRules.ts'
import { FRAME, FRAME_WIDTH } from './pageFlow.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'
import { drawLines, heightOf, wrapText, type Line, type Span } from './wrapText.ts'

export interface PageFoot {
  checkUrl: string
  /** "Check code", then the code with its entry and where to look it up. */
  codeLabel: string
  codeText: string
  /** Code and entry alone, for the pages after the first. */
  codeShort: string
  shows: string
  qrAlt: string
  printed: string
  /** "page 1 of 2" */
  pageWord: (page: number, pages: number) => string
}

/** What the foot of a later page says. */
export type LaterFoot = Pick<PageFoot, 'codeLabel' | 'codeShort' | 'printed' | 'pageWord'>

/** 17 mm. */
const QR_SIZE = (17 * 72) / 25.4
const GAP = 12
const PADDING = 6
/** Four modules stay white around the QR code: of the 29 or more that an address needs, so this much. */
const QUIET = (4 * QR_SIZE) / 29 + 0.4
const WORDS_X = FRAME.left + QR_SIZE + GAP

/** Heights of the first page's foot and of those after it, points, the rule and the white over it included. */
export function footHeights(canvas: Canvas, foot: PageFoot): { first: number; later: number } {
  const { code, shows } = setWords(canvas, foot)
  const words = heightOf(code, STYLES.running.leading) + 2 + heightOf(shows, STYLES.note.leading)
  return { first: Math.max(QR_SIZE, words) + QUIET + 8, later: STYLES.running.leading + PADDING + 8 }
}

/** Draws the first page's foot at its bottom: the QR code, the check code and what it shows. */
export function drawFirstFoot(canvas: Canvas, parent: Element, { foot, pages }: { foot: PageFoot; pages: number }): void {
  const height = footHeights(canvas, foot).first - 8
  const top = FRAME.bottom - height
  const { code, shows, width } = setWords(canvas, foot)
  drawRule(canvas, { x: FRAME.left, y: top, width: FRAME_WIDTH }, 0.6)
  const y = top + QUIET
  const bbox: [number, number, number, number] = [FRAME.left, y, FRAME.left + QR_SIZE, y + QR_SIZE]
  addElement(canvas, parent, 'Figure', () => drawQr(canvas, foot.checkUrl, { x: FRAME.left, y }), { alt: foot.qrAlt, bbox, placement: 'Block' })
  addElement(canvas, parent, 'P', () => drawLines(canvas, code, { x: WORDS_X, width, y, leading: STYLES.running.leading }))
  const showsY = y + heightOf(code, STYLES.running.leading) + 2
  addElement(canvas, parent, 'P', () => drawLines(canvas, shows, { x: WORDS_X, width, y: showsY, leading: STYLES.note.leading }))
  const bottom = FRAME.bottom - STYLES.running.leading
  addElement(canvas, parent, 'P', () => drawAtRight(canvas, foot.printed, bottom - STYLES.running.leading))
  drawArtifact(canvas, () => drawAtRight(canvas, foot.pageWord(1, pages), bottom), 'Pagination')
}

/** Draws the foot of a later page: code, time of printing and page on one line. */
export function drawLaterFoot(canvas: Canvas, { foot, page, pages }: { foot: LaterFoot; page: number; pages: number }): void {
  const { left, bottom, width } = canvas.frame
  const y = bottom - STYLES.running.leading
  drawRule(canvas, { x: left, y: y - PADDING, width }, 0.6)
  drawArtifact(canvas, () => {
    const right = `${foot.printed}, ${foot.pageWord(page, pages)}`
    drawAtRight(canvas, right, y)
    const room = width - measureText(canvas, right, STYLES.running) - GAP
    const words = wrapText(canvas, codeSpans(foot.codeLabel, foot.codeShort), room).slice(0, 1)
    drawLines(canvas, words, { x: left, y, width: room, leading: STYLES.running.leading })
  }, 'Pagination')
}

function setWords(canvas: Canvas, foot: PageFoot): { code: Line[]; shows: Line[]; width: number } {
  const right = Math.max(...[foot.printed, foot.pageWord(999, 999)].map((text) => measureText(canvas, text, STYLES.running)))
  const width = FRAME.right - right - 1.5 * GAP - WORDS_X
  return {
    width,
    code: wrapText(canvas, codeSpans(foot.codeLabel, foot.codeText), width),
    shows: wrapText(canvas, [{ text: foot.shows, style: STYLES.note }], width),
  }
}

function codeSpans(label: string, text: string): Span[] {
  return [...(label === '' ? [] : [{ text: `${label} `, style: STYLES.runningBold }]), { text, style: STYLES.running }]
}

function drawAtRight(canvas: Canvas, text: string, y: number): void {
  drawText(canvas, text, { x: canvas.frame.right - measureText(canvas, text, STYLES.running), y }, STYLES.running)
}

/** A QR code of middle correction as one path; runs of dark modules are drawn as one rectangle each. */
function drawQr({ doc }: Canvas, text: string, { x, y }: { x: number; y: number }): void {
  const { modules } = create(text, { errorCorrectionLevel: 'M' })
  const side = QR_SIZE / modules.size
  for (let row = 0; row < modules.size; row += 1) {
    let from: number | null = null
    for (let column = 0; column <= modules.size; column += 1) {
      const isDark = column < modules.size && modules.get(row, column) === 1
      if (isDark && from === null) from = column
      if (!isDark && from !== null) {
        doc.rect(x + from * side, y + row * side, (column - from) * side, side)
        from = null
      }
    }
  }
  doc.fill('#000000')
}
