import { addElement, type Canvas, type Element } from './canvas.ts'
import { drawRule } from './drawRules.ts'
import { FRAME, FRAME_WIDTH, type Flow } from './pageFlow.ts'
import { drawText } from './setText.ts'
import { STYLES } from './styles.ts'

/** A name and a line to write on by hand. */
export interface WriteLine { label: string; isWide?: boolean }

const HEIGHT = 21
const GAP = 18
const LABEL = 84

/** Draws lines to write on, two beside one another unless one takes the whole width. */
export function drawWriteLines(flow: Flow, parent: Element, lines: readonly WriteLine[]): void {
  const { canvas } = flow
  let isLeft = true
  for (const line of lines) {
    if (line.isWide && !isLeft) {
      flow.y += HEIGHT
      isLeft = true
    }
    drawWriteLine(canvas, parent, { line, y: flow.y, isLeft })
    if (line.isWide || !isLeft) flow.y += HEIGHT
    isLeft = line.isWide === true || !isLeft
  }
  if (!isLeft) flow.y += HEIGHT
}

function drawWriteLine(canvas: Canvas, parent: Element, { line, y, isLeft }: { line: WriteLine; y: number; isLeft: boolean }): void {
  const half = (FRAME_WIDTH - GAP) / 2
  const x = isLeft ? FRAME.left : FRAME.left + half + GAP
  const width = line.isWide ? FRAME_WIDTH : half
  if (line.label !== '') addElement(canvas, parent, 'P', () => drawText(canvas, line.label, { x, y: y + 6 }, STYLES.label))
  const from = line.label === '' && line.isWide ? x : x + LABEL
  drawRule(canvas, { x: from, y: y + 18, width: x + width - from }, 0.4)
}
