import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import type { Canvas } from '../parts/canvas.ts'
import { drawMethodMark } from '../parts/drawMarks.ts'
import { fitPlan } from '../parts/planScale.ts'
import { toPageRings, tracePath } from '../parts/planShapes.ts'
import { ELDER, RULES } from '../parts/styles.ts'
import type { SummaryBlock } from '../seasonReportData.ts'

interface Box { x: number; y: number; width: number; height: number }

const MARK = 5
const DAY_MS = 86_400_000
const dayNumber = (civilDate: string): number => Date.parse(`${civilDate}T00:00:00Z`) / DAY_MS

/** The soil line of a block over the days of the season: what was sprayed above it, what went into the ground below it, months as hair lines. */
export function drawSeasonStrip(canvas: Canvas, marks: SummaryBlock['marks'], span: { from: string; to: string }, { x, y, width, height }: Box): void {
  const { doc } = canvas
  const [first, last] = [dayNumber(span.from), dayNumber(span.to)]
  const placeOf = (on: string) => x + (last === first ? 0.5 : (dayNumber(on) - first) / (last - first)) * (width - MARK) + MARK / 2
  const middle = y + height / 2
  doc.lineWidth(0.3).strokeColor(RULES.hair)
  for (const start of monthStarts(span)) doc.moveTo(placeOf(start), y - 3).lineTo(placeOf(start), y + height + 3).stroke()
  doc.lineWidth(0.6).strokeColor('#555555').moveTo(x, middle).lineTo(x + width, middle).stroke()
  for (const { method, on } of marks) {
    const isAbove = method === 'foliar' || method === 'solid'
    drawMethodMark(canvas, method, { x: placeOf(on) - MARK / 2, y: isAbove ? middle - MARK - 0.6 : middle + 0.8, size: MARK })
  }
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
