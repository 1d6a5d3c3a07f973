import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import type { Canvas } from '../parts/canvas.ts'
import { drawMethodMark } from '../parts/drawMarks.ts'
import { fitPlan } from '../parts/planScale.ts'
import { toPageRings, tracePath } from '../parts/planShapes.ts'
import { drawText, measureText } from '../parts/setText.ts'
import { ELDER, RULES, STYLES } from '../parts/styles.ts'
import type { SummaryBlock } from '../seasonReportData.ts'

interface Box { x: number; y: number; width: number; height: number }

const MARK = 5
/** White between the strip and the next column. */
const ROOM_AFTER = 8
const DAY_MS = 86_400_000
const dayNumber = (civilDate: string): number => Date.parse(`${civilDate}T00:00:00Z`) / DAY_MS

/** The soil line of a block over the days of the season: what was sprayed above it, what went into the ground below it, months as hair lines. */
export function drawSeasonStrip(canvas: Canvas, marks: SummaryBlock['marks'], span: { from: string; to: string }, { x, y, width, height }: Box): void {
  const { doc } = canvas
  const placeOf = placesOf(span, { x, width })
  const middle = y + height / 2
  doc.lineWidth(0.3).strokeColor(RULES.hair)
  for (const start of monthStarts(span)) doc.moveTo(placeOf(start), y - 3).lineTo(placeOf(start), y + height + 3).stroke()
  doc.lineWidth(0.6).strokeColor('#555555').moveTo(x, middle).lineTo(x + width, middle).stroke()
  for (const { method, on } of marks) {
    const isAbove = method === 'foliar' || method === 'solid'
    drawMethodMark(canvas, method, { x: placeOf(on) - MARK / 2, y: isAbove ? middle - MARK - 0.6 : middle + 0.8, size: MARK })
  }
}

/** The months over the strips, each at its hair line; one that has no room before the next is left out. @param wordOf a month's short name, by a day of it. */
export function drawStripMonths(canvas: Canvas, span: { from: string; to: string }, { x, y, width }: Omit<Box, 'height'>, wordOf: (day: string) => string): void {
  const placeOf = placesOf(span, { x, width })
  const months = [{ at: x, word: wordOf(span.from) }, ...monthStarts(span).map((start) => ({ at: placeOf(start), word: wordOf(start) }))]
  for (const [index, { at, word }] of months.entries()) {
    const room = (months[index + 1]?.at ?? x + width + ROOM_AFTER) - at
    if (measureText(canvas, word, STYLES.columnHead) + 2 <= room) drawText(canvas, word, { x: at, y }, STYLES.columnHead)
  }
}

/** Where a civil day of a span stands across a strip. */
function placesOf({ from, to }: { from: string; to: string }, { x, width }: Pick<Box, 'x' | 'width'>): (on: string) => number {
  const [first, last] = [dayNumber(from), dayNumber(to)]
  return (on) => x + (last === first ? 0.5 : (dayNumber(on) - first) / (last - first)) * (width - MARK) + MARK / 2
}

/** First days of the months that begin within a span. */
function monthStarts({ from, to }: { from: string; to: string }): string[] {
  const starts: string[] = []
  for (let year = Number(from.slice(0, 4)), month = Number(from.slice(5, 7)) + 1; ; month += 1) {
    if (month > 12) [year, month] = [year + 1, 1]
    const start = `${year}-${String(month).padStart(2, '0')}-01`
    if (start > to) return starts
    starts.push(start)
  }
}

/** The true outline of a block, small. */
export function drawBlockGlyph(canvas: Canvas, geometry: Boundary, box: Box): void {
  const plan = toPlan({ geometry })
  tracePath(canvas, toPageRings(geometry, { view: fitPlan(plan, box, 0.02), origin: plan.origin }), { closes: true })
  canvas.doc.lineJoin('miter').lineWidth(0.8).stroke(ELDER)
}
