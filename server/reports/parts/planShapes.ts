import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import type { Canvas } from './canvas.ts'
import type { PagePoint } from './labelPlace.ts'
import type { PlanView } from './planScale.ts'
import type { PlanSite } from './planTypes.ts'

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
