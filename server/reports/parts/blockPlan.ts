import type { Method } from '../../../shared/contract/recordContent.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { toPlan } from '../../../shared/geo/projectToPlan.ts'
import { addElement, type Canvas, type Element } from './canvas.ts'
import { fillTreated, type Ground } from './fillTreated.ts'
import { drawGround } from './drawGround.ts'
import { nameSurroundings, writeBlock } from './planLabels.ts'
import { fitPlan, type PlanBox } from './planScale.ts'
import { toPageLines, toPageRings, tracePath } from './planShapes.ts'
import type { BlockPlan, Drawing, GroundPiece, PlanSite } from './planTypes.ts'
import { drawScaleFoot, SCALE_FOOT_HEIGHT } from './scaleFoot.ts'
import { ELDER } from './styles.ts'

/** Height of a plan with what stands under it, points. */
export const planHeight = (frameHeight: number): number => frameHeight + SCALE_FOOT_HEIGHT

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
    nameSurroundings(drawing, { neighbours: plan.neighbours, sites: [...plan.ground.flatMap(named), ...plan.sites] })
    drawBlocks(drawing, plan)
    for (const block of plan.blocks) writeBlock(drawing, block, { isAlone: plan.blocks.length === 1 })
    doc.restore()
    doc.lineWidth(0.6).rect(frame.x, frame.y, frame.width, frame.height).stroke('#000000')
    const words = { scale: plan.words.scale(view.denominator), north: plan.words.north }
    drawScaleFoot(canvas, { view, frame, words, language: plan.language })
  }, { alt: plan.words.alt(view.denominator), bbox, placement: 'Block' })
  return view.denominator
}

const named = ({ kind, name, geometry }: GroundPiece): PlanSite[] => (name === null ? [] : [{ kind, name, geometry }])

function joinBoundaries(boundaries: readonly Boundary[]): Boundary {
  return {
    type: 'MultiPolygon',
    coordinates: boundaries.flatMap((boundary) => boundary.type === 'Polygon' ? [boundary.coordinates] : boundary.coordinates),
  }
}

function drawSurroundings(drawing: Drawing, { ground, sites, neighbours }: BlockPlan): void {
  const { doc } = drawing.canvas
  drawGround(drawing, ground)
  // What is drawn as ground is not drawn once more as a site.
  const drawn = new Set(ground.map(({ name }) => name))
  for (const { name, geometry } of sites) if (geometry.type === 'Point' || !drawn.has(name)) drawSite(drawing, geometry)
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
  for (const { geometry, treated } of blocks) {
    const rings = toPageRings(geometry, drawing)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.fill('#FFFFFF', 'even-odd')
    if (treated === 'whole') fillTreated(canvas, [rings], { frame, method })
    else for (const part of treated) drawPart(drawing, toPageRings(part, drawing), { rings, method })
    canvas.doc.lineJoin('miter').lineWidth(1.4)
    tracePath(canvas, rings, { closes: true })
    canvas.doc.stroke(ELDER)
  }
}

/** A part that was drawn, no further than its block goes. */
function drawPart({ canvas, frame }: Drawing, part: Ground, { rings, method }: { rings: Ground; method: Method }): void {
  fillTreated(canvas, [rings, part], { frame, method })
  canvas.doc.lineWidth(0.8).dash(3, { space: 1.6 })
  tracePath(canvas, part, { closes: true })
  canvas.doc.stroke('#000000').undash()
}
