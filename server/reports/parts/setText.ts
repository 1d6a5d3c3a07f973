import type { Canvas, TextStyle } from './canvas.ts'
import { BOX, measureRun } from './measureRun.ts'
import { isRightToLeft, placeRuns } from './placeRuns.ts'
import type { Run } from './splitRuns.ts'

/** Half of what ascent and descent of Noto Sans differ by, of the size: puts a line's letters in the middle of its leading. */
const MIDDLE = 0.388

/** Width of words on one line, points. */
export function measureText(canvas: Canvas, text: string, { weight, size }: Pick<TextStyle, 'weight' | 'size'>): number {
  return canvas.runsOf(text, weight).reduce((width, run) => width + measureRun(canvas, run, size), 0)
}

/** Draws words on one line whose top left corner is given, points from the page's top left. */
export function drawText(canvas: Canvas, text: string, at: { x: number; y: number }, style: TextStyle): void {
  drawSpans(canvas, [{ text, style }], { ...at, leading: style.leading, fromRight: isRightToLeft(text) })
}

/** Draws words of several styles on one line. */
export function drawSpans(
  canvas: Canvas, spans: readonly { text: string; style: TextStyle }[], at: { x: number; y: number; leading: number; fromRight: boolean },
): void {
  const { doc } = canvas
  for (const { run, style, left, spoken, isReversed } of placeRuns(canvas, spans, at.fromRight)) {
    const baseline = at.y + at.leading / 2 + style.size * MIDDLE
    // Readers by ear and who copies the words get what was typed, in its order.
    if (spoken !== null) doc.markContent('Span', { actual: spoken })
    if (isReversed) doc.markContent('ReversedChars')
    if (run.isBox) drawBox(canvas, run, { left: at.x + left, baseline, style })
    else doc.font(run.face).fontSize(style.size).fillColor(style.color).text(run.text, at.x + left, baseline, { lineBreak: false, baseline: 'alphabetic' })
    if (spoken !== null || isReversed) doc.endMarkedContent()
  }
}

/** A box of a letter's height with its code points on two lines: something stands here that this print cannot draw. */
function drawBox(canvas: Canvas, run: Run, { left, baseline, style: { size, color } }: { left: number; baseline: number; style: TextStyle }): void {
  const { doc } = canvas
  canvas.hasReplaced = true
  const x = left + BOX.gap * size
  const width = measureRun(canvas, run, size) - 2 * BOX.gap * size
  doc.lineWidth(0.4).strokeColor(color).rect(x, baseline - 0.9 * size, width, 1.04 * size).stroke()
  doc.font(run.face).fontSize(size * BOX.digits).fillColor(color)
  const inside = { lineBreak: false, baseline: 'alphabetic' } as const
  doc.text('U+', x + BOX.padding * size, baseline - 0.44 * size, inside)
  doc.text(run.text.slice(2), x + BOX.padding * size, baseline + 0.03 * size, inside)
}
