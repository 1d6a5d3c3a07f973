import type { Method } from '../../../shared/contract/recordContent.ts'
import type { Canvas } from './canvas.ts'
import type { PagePoint } from './labelPlace.ts'
import type { PlanBox } from './planScale.ts'
import { tracePath } from './planShapes.ts'

const GREY = '#7A7A7A'
const LATTICE = 6.75
const LINES = 4.9

/** Ground as rings of the page; a place lies in it where an odd number of them goes around it. */
export type Ground = readonly PagePoint[][]

/**
 * What was treated, over the part of the frame inside every ground given: dots for a spray, upright lines for a drench, upright dashes
 * for an injected one, small heaps for a solid.
 */
export function fillTreated(canvas: Canvas, grounds: readonly Ground[], { frame, method }: { frame: PlanBox; method: Method }): void {
  const { doc } = canvas
  doc.save()
  for (const rings of grounds) {
    tracePath(canvas, rings, { closes: true })
    doc.clip('even-odd')
  }
  doc.strokeColor(GREY)
  FILLS[method](canvas, frame)
  doc.restore()
}

const FILLS: Record<Method, (canvas: Canvas, frame: PlanBox) => void> = {
  foliar({ doc }, frame) {
    doc.lineCap('round').lineWidth(1.9).dash(0.01, { space: LATTICE - 0.01 })
    for (const [x, y] of rowStarts(frame)) doc.moveTo(x, y).lineTo(frame.x + frame.width, y).stroke()
  },
  drench({ doc }, frame) {
    doc.lineWidth(0.9)
    drawUprights(doc, frame)
  },
  injected({ doc }, frame) {
    doc.lineWidth(1.1).dash(3.4, { space: 2.6 })
    drawUprights(doc, frame)
  },
  solid({ doc }, frame) {
    doc.lineWidth(0.8)
    for (const [from, y] of rowStarts(frame)) {
      for (let x = from; x < frame.x + frame.width; x += LATTICE) doc.moveTo(x - 1.6, y + 1.2).lineTo(x, y - 1.2).lineTo(x + 1.6, y + 1.2)
    }
    doc.stroke()
  },
}

function drawUprights(doc: Canvas['doc'], frame: PlanBox): void {
  for (let x = frame.x + 2; x < frame.x + frame.width; x += LINES) doc.moveTo(x, frame.y).lineTo(x, frame.y + frame.height).stroke()
}

/** Where each row of a lattice begins; every second row is set half a step in. */
function rowStarts(frame: PlanBox): PagePoint[] {
  const rows = Math.floor((frame.height - 1.7) / (LATTICE / 2)) + 1
  return Array.from({ length: rows }, (_none, row) => [frame.x + 1.7 + (row % 2) * (LATTICE / 2), frame.y + 1.7 + (row * LATTICE) / 2])
}
