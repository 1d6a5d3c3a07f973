import type { Canvas, TextStyle } from './canvas.ts'

/** Half of what ascent and descent of Noto Sans differ by, of the size: puts a line's letters in the middle of its leading. */
const MIDDLE = 0.388

/** Width of words on one line, points. */
export function measureText(canvas: Canvas, text: string, { weight, size }: Pick<TextStyle, 'weight' | 'size'>): number {
  let width = 0
  for (const run of canvas.runsOf(text, weight)) width += canvas.doc.font(run.face).fontSize(size).widthOfString(run.text)
  return width
}

/** Draws words on one line whose top left corner is given, points from the page's top left. */
export function drawText(canvas: Canvas, text: string, { x, y }: { x: number; y: number }, style: TextStyle): void {
  const { doc } = canvas
  const baseline = y + style.leading / 2 + style.size * MIDDLE
  let left = x
  for (const run of canvas.runsOf(text, style.weight)) {
    doc.font(run.face).fontSize(style.size).fillColor(style.color)
    const width = doc.widthOfString(run.text)
    if (run.standsFor !== null) {
      canvas.hasReplaced = true
      // Readers by ear and who copies the words still get what was typed.
      doc.markContent('Span', { actual: run.standsFor })
    }
    doc.text(run.text, left, baseline, { lineBreak: false, baseline: 'alphabetic' })
    if (run.standsFor !== null) doc.endMarkedContent()
    left += width
  }
}
