import { drawArtifact, type Canvas } from './canvas.ts'
import { drawLogo } from './drawMarks.ts'
import { drawRule } from './drawRules.ts'
import { isolate } from './placeRuns.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'
import { drawLines, wrapText } from './wrapText.ts'

export interface RunningHead { farm: string; register: string; document: string }

const LOGO = 12

/** Draws the line at the top of every page: whose register, which document. */
export function drawRunningHead(canvas: Canvas, { farm, register, document }: RunningHead): void {
  const { frame } = canvas
  const y = frame.top
  drawArtifact(canvas, () => {
    drawLogo(canvas, { x: frame.left, y: y - 0.4, size: LOGO })
    const right = measureText(canvas, document, STYLES.running)
    drawText(canvas, document, { x: frame.right - right, y }, STYLES.running)
    const x = frame.left + LOGO + 5
    const spans = [{ text: isolate(farm), style: STYLES.runningBold }, { text: `, ${register}`, style: STYLES.running }]
    const room = frame.right - right - 12 - x
    drawLines(canvas, wrapText(canvas, spans, room).slice(0, 1), { x, y, width: room, leading: STYLES.running.leading })
  }, 'Pagination')
  drawRule(canvas, { x: frame.left, y: y + 16.5, width: frame.width }, 0.6)
}
