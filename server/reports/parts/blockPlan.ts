import type { Method } from '../../../shared/contract/recordContent.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { PlanSite } from '../recordReportData.ts'
import { addElement, type Canvas, type Element, type TextStyle } from './canvas.ts'
import { findLabelPlace, type Stretch } from './labelPlace.ts'
import { findLineLabel } from './lineLabel.ts'
import { fitPlan, type PlanBox, type PlanView } from './planScale.ts'
import { fillTreated, toPageLines, toPageRings, tracePath } from './planShapes.ts'
import { drawScaleFoot, SCALE_FOOT_HEIGHT } from './scaleFoot.ts'
import { drawText, measureText } from './setText.ts'
import { ELDER, STYLES } from './styles.ts'

export interface BlockPlan {
  blocks: readonly { code: string; note: string; geometry: Boundary }[]
  neighbours: readonly { code: string; geometry: Boundary }[]
  sites: readonly PlanSite[]
  method: Method
  language: Language
  /** Words around it; the scale's are made of its number. */
  words: { north: string; scale: (denominator: number) => string; alt: (denominator: number) => string }
}

const CODE: TextStyle = { size: 12, leading: 14, weight: 'bold', color: ELDER }
const SMALL_CODES = [{ ...CODE, size: 8.5, leading: 10 }, { ...CODE, size: 6.5, leading: 7.5 }, { ...CODE, size: 5, leading: 6 }] as const
const NAME: TextStyle = { size: 7.5, leading: 9, weight: 'italic', color: '#000000' }
const NEIGHBOUR: TextStyle = { size: 7.5, leading: 9, weight: 'regular', color: '#555555' }

/** Height of a plan with what stands under it, points. */
export const planHeight = (frameHeight: number): number => frameHeight + SCALE_FOOT_HEIGHT

interface Drawing { canvas: Canvas; frame: PlanBox; view: PlanView; origin: Position }

/** Draws the blocks to scale, north up, with what lies around them; returns N of the scale "1 : N". */
export function drawBlockPlan(canvas: Canvas, parent: Element, { plan, frame }: { plan: BlockPlan; frame: PlanBox }): number {
  const whole = toPlan({ geometry: joinBoundaries(plan.blocks.map(({ geometry }) => geometry)) })
  const view = fitPlan(whole, frame)
  const drawing: Drawing = { canvas, frame, view, origin: whole.origin }
  const bbox: [number, number, number, number] = [frame.x, frame.y, frame.x + frame.width, frame.y + planHeight(frame.height)]
  addElement(canvas, parent, 'Figure', () => {
    const { doc } = canvas
    doc.save().rect(frame.x, frame.y, frame.width, frame.height).clip()
    drawSurroundings(drawing, plan)
    nameSurroundings(drawing, plan)
    drawBlocks(drawing, plan)
    for (const block of plan.blocks) writeBlock(drawing, block, { isAlone: plan.blocks.length === 1 })
    doc.restore()
    doc.lineWidth(0.6).rect(frame.x, frame.y, frame.width, frame.height).stroke('#000000')
    const words = { scale: plan.words.scale(view.denominator), north: plan.words.north }
    drawScaleFoot(canvas, { view, frame, words, language: plan.language })
  }, { alt: plan.words.alt(view.denominator), bbox, placement: 'Block' })
  return view.denominator
}

function joinBoundaries(boundaries: readonly Boundary[]): Boundary {
  return {
    type: 'MultiPolygon',
    coordinates: boundaries.flatMap((boundary) => boundary.type === 'Polygon' ? [boundary.coordinates] : boundary.coordinates),
  }
}

function drawSurroundings(drawing: Drawing, { sites, neighbours }: BlockPlan): void {
  const { doc } = drawing.canvas
  for (const { geometry } of sites) drawSite(drawing, geometry)
  doc.lineWidth(0.5)
  for (const { geometry } of neighbours) {
    tracePath(drawing.canvas, toPageRings(geometry, drawing), { closes: true })
    doc.stroke('#888888')
  }
}

function drawSite(drawing: Drawing, geometry: PlanSite['geometry']): void {
  const { canvas } = drawing
  const { doc } = canvas
  const lines = toPageLines(geometry, drawing)
  if (geometry.type === 'Point') {
    const [x, y] = lines[0]?.[0] ?? [0, 0]
    doc.lineWidth(0.9).circle(x, y, 2.2).fillAndStroke('#FFFFFF', '#000000')
    return
  }
  if (geometry.type === 'Polygon' || geometry.type === 'MultiPolygon') {
    doc.lineWidth(0.7).dash(2.5, { space: 1.5 })
    tracePath(canvas, lines, { closes: true })
    doc.stroke('#555555').undash()
    return
  }
  for (const [width, color] of [[5, '#666666'], [3.8, '#FFFFFF']] as const) {
    doc.lineJoin('round').lineWidth(width)
    tracePath(canvas, lines, { closes: false })
    doc.stroke(color)
  }
}

function drawBlocks(drawing: Drawing, { blocks, method }: BlockPlan): void {
  const { canvas, frame } = drawing
  for (const { geometry } of blocks) {
    const rings = toPageRings(geometry, drawing)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.fill('#FFFFFF', 'even-odd')
    fillTreated(canvas, rings, { frame, method })
    canvas.doc.lineJoin('miter').lineWidth(1.4)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.stroke(ELDER)
  }
}

function nameSurroundings(drawing: Drawing, { neighbours, sites }: BlockPlan): void {
  const { canvas, frame } = drawing
  for (const { code, geometry } of neighbours) {
    const place = findLabelPlace(toPageRings(geometry, drawing), frame, NEIGHBOUR.leading)
    if (place && measureText(canvas, code, NEIGHBOUR) + 4 < place.width) writeAt(canvas, place, [{ text: code, style: NEIGHBOUR }])
  }
  const written = new Set<string>()
  for (const { name, geometry } of sites) {
    // A lane in several pieces is named once.
    if (!written.has(name) && writeSiteName(drawing, name, geometry)) written.add(name)
  }
}

/** @returns whether there was room for the name. */
function writeSiteName(drawing: Drawing, name: string, geometry: PlanSite['geometry']): boolean {
  const { canvas, frame } = drawing
  const lines = toPageLines(geometry, drawing)
  const width = measureText(canvas, name, NAME)
  if (geometry.type === 'Point') {
    const [x, y] = lines[0]?.[0] ?? [0, 0]
    const isAtEdge = x + width + 8 > frame.x + frame.width
    writeAt(canvas, { x: isAtEdge ? x - 5 - width / 2 : x + 5 + width / 2, y, width }, [{ text: name, style: NAME }])
    return true
  }
  if (geometry.type === 'Polygon' || geometry.type === 'MultiPolygon') {
    const place = findLabelPlace(lines, frame, NAME.leading)
    if (!place || place.width <= width) return false
    writeAt(canvas, place, [{ text: name, style: NAME }])
    return true
  }
  const place = findLineLabel(lines, frame, width)
  if (!place) return false
  canvas.doc.save().translate(place.x, place.y).rotate(place.turn)
  writeAt(canvas, { x: 0, y: 0, width }, [{ text: name, style: NAME }])
  canvas.doc.restore()
  return true
}

/** Code and area inside the block where there is room, else the code in the largest size that fits; a lone one beside it. */
function writeBlock({ canvas, frame, ...place }: Drawing, { code, note, geometry }: BlockPlan['blocks'][number], { isAlone }: { isAlone: boolean }): void {
  const rings = toPageRings(geometry, place)
  const full: Label = [{ text: code, style: CODE }, { text: note, style: STYLES.small }]
  const labels: Label[] = [full, ...SMALL_CODES.map((style) => [{ text: code, style }])]
  for (const label of labels) {
    const height = label.reduce((sum, { style }) => sum + style.leading, 0)
    const width = Math.max(...label.map(({ text, style }) => measureText(canvas, text, style)))
    const room = findLabelPlace(rings, frame, height)
    if (room && room.width > width + 3) return writeAt(canvas, room, label)
  }
  // Beside one of several it might stand in another's ground; the table names them all.
  if (!isAlone) return
  const style = SMALL_CODES[0]
  const right = Math.max(...rings.flat().map(([x]) => x))
  const ys = rings.flat().map(([, y]) => y)
  const y = (Math.min(...ys) + Math.max(...ys)) / 2
  writeAt(canvas, { x: right + 4 + measureText(canvas, code, style) / 2, y, width: 0 }, [{ text: code, style }])
}

type Label = readonly { text: string; style: TextStyle }[]

/** Words centred on a white ground. */
function writeAt(canvas: Canvas, { x, y }: Stretch, lines: Label): void {
  const widths = lines.map(({ text, style }) => measureText(canvas, text, style))
  const height = lines.reduce((sum, { style }) => sum + style.leading, 0)
  const width = Math.max(...widths)
  canvas.doc.rect(x - width / 2 - 1.5, y - height / 2, width + 3, height).fill('#FFFFFF')
  let top = y - height / 2
  lines.forEach(({ text, style }, index) => {
    drawText(canvas, text, { x: x - (widths[index] ?? 0) / 2, y: top }, style)
    top += style.leading
  })
}
