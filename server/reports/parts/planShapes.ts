import type { Method } from '../../../shared/contract/recordContent.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import type { PlanSite } from '../recordReportData.ts'
import type { Canvas } from './canvas.ts'
import type { PagePoint } from './labelPlace.ts'
import type { PlanBox, PlanView } from './planScale.ts'

/** Rings of a boundary as points of the page. */
export function toPageRings(geometry: Boundary, { view, origin }: { view: PlanView; origin: Position }): PagePoint[][] {
  return toPlan({ geometry, origin }).rings.map(({ points }) => points.map((point) => view.toPage(point)))
}

/** Lines, points or rings of a site as points of the page. */
export function toPageLines(geometry: PlanSite['geometry'], place: { view: PlanView; origin: Position }): PagePoint[][] {
  if (geometry.type === 'Polygon' || geometry.type === 'MultiPolygon') return toPageRings(geometry, place)
  const lines = geometry.type === 'Point' ? [[geometry.coordinates]]
    : geometry.type === 'LineString' ? [geometry.coordinates] : geometry.coordinates
  return toPageRings({ type: 'Polygon', coordinates: lines }, place)
}

/** Lays rings or lines down as the current path. */
export function tracePath({ doc }: Canvas, lines: readonly PagePoint[][], { closes }: { closes: boolean }): void {
  for (const line of lines) {
    line.forEach(([x, y], index) => (index === 0 ? doc.moveTo(x, y) : doc.lineTo(x, y)))
    if (closes) doc.closePath()
  }
}

const LATTICE = 6.75

/** Dots (a spray) or upright lines (a drench) over the part of the frame inside the rings. */
export function fillTreated(canvas: Canvas, rings: readonly PagePoint[][], { frame, method }: { frame: PlanBox; method: Method }): void {
  const { doc } = canvas
  doc.save()
  tracePath(canvas, rings, { closes: true })
  doc.clip('even-odd')
  if (method === 'foliar') {
    doc.lineCap('round').lineWidth(1.9).strokeColor('#7A7A7A').dash(0.01, { space: LATTICE - 0.01 })
    for (let row = 0, y = frame.y + 1.7; y < frame.y + frame.height; row += 1, y += LATTICE / 2) {
      doc.moveTo(frame.x + 1.7 + (row % 2) * (LATTICE / 2), y).lineTo(frame.x + frame.width, y).stroke()
    }
  } else {
    doc.lineWidth(0.9).strokeColor('#7A7A7A')
    for (let x = frame.x + 2; x < frame.x + frame.width; x += 4.9) doc.moveTo(x, frame.y).lineTo(x, frame.y + frame.height).stroke()
  }
  doc.restore()
}
