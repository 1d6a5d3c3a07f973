import type { Pixel } from '../../composables/map/mapTypes.ts'
import type { PixelBox } from './pixelRing.ts'
import { coversBox } from './ringsAtBox.ts'

/** Ground that is not free: under labels already set, and of other blocks (polygons as their rings), in pixels. */
export interface TakenGround {
  labels: PixelBox[]
  blocks: readonly (readonly (readonly Pixel[])[])[]
}

/** How far a label may step aside, nearest first. */
const STEPS: readonly Pixel[] = [[0, 0], [7, 0], [-7, 0], [12, 0], [-12, 0], [0, -12], [9, -12], [-9, -12]]

/**
 * A place for a label that lies on no other label and on no other block; takes the ground it covers.
 * @param middle where it would stand, in pixels.
 * @param size its width and height in pixels.
 * @param mayStep whether it may step aside; one that stands in its own block may not.
 * @returns its middle, or null where there is no room.
 */
export function freeSpot(taken: TakenGround, middle: Pixel, [width, height]: readonly [number, number], mayStep: boolean): Pixel | null {
  for (const [dx, dy] of mayStep ? STEPS : STEPS.slice(0, 1)) {
    const at: Pixel = [middle[0] + dx, middle[1] + dy]
    const box = {
      minX: at[0] - width / 2, maxX: at[0] + width / 2, minY: at[1] - height / 2, maxY: at[1] + height / 2,
    }
    if (taken.labels.some((other) => overlap(box, other)) || coversBox(taken.blocks, box)) continue
    taken.labels.push(box)
    return at
  }
  return null
}

function overlap(a: PixelBox, b: PixelBox): boolean {
  return a.minX < b.maxX && b.minX < a.maxX && a.minY < b.maxY && b.minY < a.maxY
}
