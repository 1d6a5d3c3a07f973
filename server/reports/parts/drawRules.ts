import { drawArtifact, type Canvas } from './canvas.ts'
import { RULES } from './styles.ts'

export interface Stretch { x: number; y: number; width: number }

/** A level line whose middle lies at `y`. */
export function drawRule(canvas: Canvas, { x, y, width }: Stretch, weight: number, color: string = RULES.ink): void {
  drawArtifact(canvas, () => {
    canvas.doc.lineWidth(weight).strokeColor(color).moveTo(x, y).lineTo(x + width, y).stroke()
  })
}

/** The thick and the thin line over a section or under the number; returns how high they are together, points. */
export function drawDoubleRule(canvas: Canvas, { x, y, width }: Stretch, [thick, thin]: readonly [number, number]): number {
  const gap = thick === thin ? 1.1 : 1.5
  drawRule(canvas, { x, y: y + thick / 2, width }, thick)
  drawRule(canvas, { x, y: y + thick + gap + thin / 2, width }, thin)
  return thick + gap + thin
}

/** The double upright line at which the columns of an account begin. */
export function drawAccountLine(canvas: Canvas, x: number, { top, bottom }: { top: number; bottom: number }): void {
  drawArtifact(canvas, () => {
    canvas.doc.lineWidth(0.5).strokeColor(RULES.account)
    for (const at of [x, x + 1.5]) canvas.doc.moveTo(at, top).lineTo(at, bottom).stroke()
  })
}
