import type { Canvas, TextStyle } from './canvas.ts'
import { isRightToLeft } from './placeRuns.ts'
import { drawSpans, measureText } from './setText.ts'
import { toLetters } from './splitRuns.ts'

/** Words set in one style. */
export interface Span { text: string; style: TextStyle }
export interface Line {
  spans: Span[]
  width: number
  /** The paragraph it belongs to reads from right to left. */
  fromRight: boolean
}

/** Words of several styles on lines no wider than `width` points; a word wider than that is cut between letters. */
export function wrapText(canvas: Canvas, spans: readonly Span[], width: number): Line[] {
  const fromRight = isRightToLeft(spans.map(({ text }) => text).join(''))
  const lines: Line[] = [openLine(fromRight)]
  for (const word of toWords(spans)) {
    if (word.breaksLine) {
      lines.push(openLine(fromRight))
      continue
    }
    const bare = word.spans.map(({ text, style }) => ({ text: text.replace(/ +$/, ''), style }))
    const line = lines.at(-1)
    if (line && line.width + widthOf(canvas, bare) > width && line.spans.length > 0) lines.push(openLine(fromRight))
    if (widthOf(canvas, bare) > width) cutWord(canvas, word.spans, { lines, width })
    else appendWord(canvas, lines, word.spans)
  }
  return lines.map((line) => trimLine(canvas, line))
}

/** Height of lines, points. */
export function heightOf(lines: readonly Line[], leading: number): number {
  return lines.length * leading
}

export interface LineBox { x: number; y: number; width: number; leading: number; align?: 'left' | 'right' }

/** Draws lines one under the other. */
export function drawLines(canvas: Canvas, lines: readonly Line[], box: LineBox): void {
  lines.forEach((line, index) => {
    const x = box.align === 'right' ? box.x + box.width - line.width : box.x
    drawSpans(canvas, line.spans, { x, y: box.y + index * box.leading, leading: box.leading, fromRight: line.fromRight })
  })
}

function openLine(fromRight: boolean): Line {
  return { spans: [], width: 0, fromRight }
}

interface Word { spans: Span[]; breaksLine: boolean }

/** Spans cut where a line may break; a word may run over several spans. */
function toWords(spans: readonly Span[]): Word[] {
  const words: Word[] = []
  let isOpen = false
  for (const { text, style } of spans) {
    for (const piece of text.match(/\r\n|[\n\r\u2028\u2029]|[^ \n\r\u2028\u2029]+ *| +/gu) ?? []) {
      const breaksLine = /^[\r\n\u2028\u2029]/.test(piece)
      const last = words.at(-1)
      if (isOpen && last && !breaksLine) last.spans.push({ text: piece, style })
      else words.push({ spans: breaksLine ? [] : [{ text: piece, style }], breaksLine })
      isOpen = !breaksLine && !piece.endsWith(' ')
    }
  }
  return words
}

function widthOf(canvas: Canvas, spans: readonly Span[]): number {
  return spans.reduce((sum, { text, style }) => sum + measureText(canvas, text, style), 0)
}

function appendWord(canvas: Canvas, lines: Line[], spans: readonly Span[]): void {
  const line = lines.at(-1)
  if (!line) return
  line.width += widthOf(canvas, spans)
  for (const span of spans) {
    const last = line.spans.at(-1)
    if (last && last.style === span.style) last.text += span.text
    else line.spans.push({ ...span })
  }
}

function cutWord(canvas: Canvas, spans: readonly Span[], { lines, width }: { lines: Line[]; width: number }): void {
  for (const { text, style } of spans) {
    let piece = ''
    let room = width - (lines.at(-1)?.width ?? 0)
    for (const letter of toLetters(text)) {
      const letterWidth = measureText(canvas, letter, style)
      if (letterWidth > room && room < width) {
        appendWord(canvas, lines, piece === '' ? [] : [{ text: piece, style }])
        lines.push(openLine(lines[0]?.fromRight ?? false))
        piece = ''
        room = width
      }
      piece += letter
      room -= letterWidth
    }
    if (piece !== '') appendWord(canvas, lines, [{ text: piece, style }])
  }
}

/** A line's width is that of what is seen; the space it ends in stays, so that who copies or hears it does not run words together. */
function trimLine(canvas: Canvas, { spans, fromRight }: Line): Line {
  const seen = spans.map(({ text, style }, index) => ({ text: index === spans.length - 1 ? text.replace(/ +$/, '') : text, style }))
  const ends = spans.at(-1)
  if (ends) ends.text = ends.text.replace(/ +$/, ' ')
  return { spans, width: widthOf(canvas, seen), fromRight }
}
