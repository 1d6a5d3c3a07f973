import { drawArtifact, type Canvas } from './canvas.ts'
import { drawLogo } from './drawMarks.ts'
import { drawRule } from './drawRules.ts'
import { isolate } from './placeRuns.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'
import { drawLines, heightOf, wrapText, type Line } from './wrapText.ts'

export interface RunningHead {
  farm: string
  register: string
  document: string
  /** The certificate, on lines of its own; empty where there is none. */
  certificate?: string
}

const LOGO = 12
/** One line with its rule and the white under it. */
const BARE = 26

/** What a running head takes of the page's height, points. */
export function headHeight(canvas: Canvas, { certificate = '' }: Pick<RunningHead, 'certificate'>): number {
  return BARE + heightOf(setCertificate(canvas, certificate), STYLES.note.leading)
}

/** Draws the line at the top of every page: whose register, which document. */
export function drawRunningHead(canvas: Canvas, { farm, register, document, certificate = '' }: RunningHead): void {
  const { frame } = canvas
  const lines = setCertificate(canvas, certificate)
  const { leading } = STYLES.note
  const y = frame.top
  drawArtifact(canvas, () => {
    drawLogo(canvas, { x: frame.left, y: y - 0.4, size: LOGO })
    const right = measureText(canvas, document, STYLES.running)
    drawText(canvas, document, { x: frame.right - right, y }, STYLES.running)
    const x = frame.left + LOGO + 5
    const spans = [{ text: isolate(farm), style: STYLES.runningBold }, { text: `, ${register}`, style: STYLES.running }]
    const room = frame.right - right - 12 - x
    drawLines(canvas, wrapText(canvas, spans, room).slice(0, 1), { x, y, width: room, leading: STYLES.running.leading })
    drawLines(canvas, lines, { x, y: y + STYLES.running.leading + 1, width: frame.right - x, leading })
  }, 'Pagination')
  drawRule(canvas, { x: frame.left, y: y + 16.5 + heightOf(lines, leading), width: frame.width }, 0.6)
}

function setCertificate(canvas: Canvas, text: string): Line[] {
  return text === '' ? [] : wrapText(canvas, [{ text, style: STYLES.note }], canvas.frame.width - LOGO - 5)
}
