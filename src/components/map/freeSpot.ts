import type { Pixel } from '../../composables/mapTypes.ts'

/** Ground that a label covers, in pixels. */
export interface LabelBox { minX: number; minY: number; maxX: number; maxY: number }

/** How far a label may step aside, nearest first. */
const STEPS: readonly Pixel[] = [[0, 0], [7, 0], [-7, 0], [12, 0], [-12, 0], [0, -12], [9, -12], [-9, -12]]

/**
 * A place for a label that lies on no other; takes the ground it covers.
 * @param mayStep whether it may step aside; one that stands in its own block may not.
 * @returns its middle, or null where there is no room.
 */
export function freeSpot(taken: LabelBox[], middle: Pixel, [width, height]: readonly [number, number], mayStep: boolean): Pixel | null {
  for (const [dx, dy] of mayStep ? STEPS : STEPS.slice(0, 1)) {
    const at: Pixel = [middle[0] + dx, middle[1] + dy]
    const box = {
      minX: at[0] - width / 2, maxX: at[0] + width / 2, minY: at[1] - height / 2, maxY: at[1] + height / 2,
    }
    if (taken.some((other) => overlap(box, other))) continue
    taken.push(box)
    return at
  }
  return null
}

function overlap(a: LabelBox, b: LabelBox): boolean {
  return a.minX < b.maxX && b.minX < a.maxX && a.minY < b.maxY && b.minY < a.maxY
}
