import type { GroundKind } from '../../../shared/contract/ground.ts'
import type { Canvas } from './canvas.ts'
import { toPageLines, tracePath } from './planShapes.ts'
import type { Drawing, GroundPiece } from './planTypes.ts'

/** One stroke of a line: as wide as the thing and `over` points more, never under `least`. */
interface Stroke { over: number; least: number; color: string }

export const GROUND_STROKES: Record<Exclude<GroundKind, 'building' | 'hedge'>, readonly Stroke[]> = {
  water: [{ over: 1.4, least: 2.6, color: '#4D5F66' }, { over: 0, least: 1.2, color: '#DDE5E8' }],
  track: [{ over: 1.2, least: 2.8, color: '#8A8577' }, { over: 0, least: 1.6, color: '#FFFFFF' }],
  other: [{ over: 0, least: 0.8, color: '#555555' }],
}
export const BUILDING = '#3D3D3D'
export const HEDGE = '#555555'

/** Draws the ground plan: outlines first, then water, lanes, hedges and buildings, casings of all lanes under all lanes. */
export function drawGround(drawing: Drawing, ground: readonly GroundPiece[]): void {
  const lines = ground.filter(({ geometry }) => geometry.type === 'LineString')
  for (const piece of ground) if (piece.geometry.type === 'Polygon' && piece.kind !== 'building') drawArea(drawing, piece)
  for (const kind of ['water', 'track', 'other'] as const) {
    for (const stroke of GROUND_STROKES[kind]) for (const piece of lines.filter((each) => each.kind === kind)) strokeLine(drawing, piece, stroke)
  }
  for (const piece of lines.filter(({ kind }) => kind === 'hedge')) dot(drawing, piece)
  for (const piece of ground) if (piece.kind === 'building') drawArea(drawing, piece)
}

function drawArea(drawing: Drawing, { kind, geometry }: GroundPiece): void {
  const { canvas } = drawing
  const { doc } = canvas
  tracePath(canvas, toPageLines(geometry, drawing), { closes: true })
  if (kind === 'building') doc.fill(BUILDING, 'even-odd')
  else if (kind === 'water') doc.lineWidth(0.8).fillAndStroke('#DDE5E8', '#4D5F66', 'even-odd')
  else if (kind === 'track') doc.lineWidth(0.7).fillAndStroke('#FFFFFF', '#8A8577', 'even-odd')
  else if (kind === 'hedge') startDots(canvas).stroke(HEDGE).undash()
  else doc.lineWidth(0.7).stroke('#555555')
}

function strokeLine(drawing: Drawing, { geometry, widthM }: GroundPiece, { over, least, color }: Stroke): void {
  const { canvas, view } = drawing
  canvas.doc.lineJoin('round').lineCap('butt').lineWidth(Math.max(least, (widthM ?? 0) * view.pointsPerMetre + over))
  tracePath(canvas, toPageLines(geometry, drawing), { closes: false })
  canvas.doc.stroke(color)
}

function dot(drawing: Drawing, { geometry }: GroundPiece): void {
  tracePath(drawing.canvas, toPageLines(geometry, drawing), { closes: false })
  startDots(drawing.canvas).stroke(HEDGE).undash().lineCap('butt')
}

function startDots({ doc }: Canvas): PDFKit.PDFDocument {
  return doc.lineWidth(1.7).lineCap('round').dash(0.1, { space: 3.4 })
}
