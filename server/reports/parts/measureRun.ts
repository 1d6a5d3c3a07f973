import type { Canvas } from './canvas.ts'
import type { Run } from './splitRuns.ts'

/** Of the size: the code points in a box, the white at their sides, the room beside the box. */
export const BOX = { digits: 0.48, padding: 0.12, gap: 0.08 }

/** Width of a run, points. */
export function measureRun({ doc }: Canvas, run: Run, size: number): number {
  if (!run.isBox) return doc.font(run.face).fontSize(size).widthOfString(run.text)
  return doc.font(run.face).fontSize(size * BOX.digits).widthOfString(run.text.slice(2)) + 2 * (BOX.padding + BOX.gap) * size
}
