import { addElement, type Element, type TextStyle } from './canvas.ts'
import { ensureRoom, type Flow } from './pageFlow.ts'
import { drawLines, heightOf, wrapText } from './wrapText.ts'

/** Draws words over the width of the page into the flow, turning the page where they do not fit. */
export function drawParagraph(flow: Flow, part: Element, text: string, style: TextStyle): void {
  const { canvas } = flow
  const lines = wrapText(canvas, [{ text, style }], canvas.frame.width)
  ensureRoom(flow, heightOf(lines, style.leading))
  const { left, width } = canvas.frame
  addElement(canvas, part, 'P', () => drawLines(canvas, lines, { x: left, y: flow.y, width, leading: style.leading }))
  flow.y += heightOf(lines, style.leading)
}
