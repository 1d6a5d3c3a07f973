import { addElement, drawArtifact, type Element } from './canvas.ts'
import { drawRule } from './drawRules.ts'
import { FRAME, type Flow } from './pageFlow.ts'
import { drawText, measureText } from './setText.ts'
import { STYLES } from './styles.ts'

/** A row of boxes to tick by hand. */
export interface TickRow {
  label: string
  /** Words over a line to write on before the boxes, empty for a bare line; without them there is none. */
  room?: string
  ticks: readonly { word: string; mark?: (at: { x: number; y: number }) => void }[]
}

const HEIGHT = 17
const LABEL = 84
const BOX = 8.5
const ROOM = 190

/** Draws the row; boxes that do not fit beside one another go on in the next. */
export function drawTicks(flow: Flow, parent: Element, { label, room, ticks }: TickRow): void {
  const { canvas } = flow
  addElement(canvas, parent, 'P', () => drawText(canvas, label, { x: FRAME.left, y: flow.y + 2 }, STYLES.label))
  const from = FRAME.left + LABEL + (room === undefined ? 0 : ROOM + 12)
  if (room !== undefined) {
    drawRule(canvas, { x: FRAME.left + LABEL, y: flow.y + 14, width: ROOM }, 0.4)
    if (room !== '') addElement(canvas, parent, 'P', () => drawText(canvas, room, { x: FRAME.left + LABEL + ROOM * 0.5, y: flow.y + 2 }, STYLES.note))
  }
  let x = from
  for (const { word, mark } of ticks) {
    const width = BOX + 5 + (mark ? 13 : 0) + measureText(canvas, word, STYLES.body)
    if (x + width > FRAME.right) {
      x = from
      flow.y += HEIGHT
    }
    const at = { x, y: flow.y + 3.4 }
    drawArtifact(canvas, () => {
      canvas.doc.lineWidth(0.7).rect(at.x, at.y, BOX, BOX).stroke('#000000')
      mark?.({ x: at.x + BOX + 4, y: at.y })
    })
    addElement(canvas, parent, 'P', () => drawText(canvas, word, { x: at.x + width - measureText(canvas, word, STYLES.body), y: flow.y + 1.8 }, STYLES.body))
    x += width + 14
  }
  flow.y += HEIGHT
}
