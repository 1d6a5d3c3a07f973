import type { Pixel } from '../../composables/map/mapTypes.ts'
import { boxOf, eachEdge } from './pixelRing.ts'
import { hasEdgeIn, isInside } from './ringsAtBox.ts'
import { thinRing } from './thinRing.ts'

type Rings = readonly (readonly Pixel[])[]

/** How much of a label has room in its block. */
export type LabelForm = 'full' | 'narrow' | 'slip' | 'code' | 'small' | 'outside'
export interface LabelSpot {
  form: LabelForm
  at: Pixel
  /** Where else it may stand: under the block, for a label outside. */
  orAt: Pixel | null
}

/** Width in pixels of a code, in the letters of a label inside its block and in the small ones. */
export interface CodeWidth { large: number; small: number }

/** Width and height in pixels that each form needs at least, best form first, and what it needs beside the code. */
const FORMS: readonly (readonly [form: LabelForm, width: number, height: number, beside: number])[] = [
  ['full', 58, 40, 3],
  ['narrow', 27, 36, 3],
  ['slip', 50, 20, 31],
  ['code', 22, 18, 3],
]
const GRID = 17
/** Height in pixels of a code in small letters. */
const SMALL_HEIGHT = 13
const OUTSIDE_GAP = 9

/**
 * Where in a block its label stands, and in which form.
 * @param rings the rings of one polygon in pixels, outer first; holes are kept clear.
 * @param others rings of other blocks in pixels; a label in its block keeps clear of their edges too.
 * @param code width in pixels of the code in large and in small letters.
 * @returns the roomiest point for the first form that fits, or points over the block's top and under its foot where none does.
 */
export function labelSpot(rings: Rings, others: Rings = [], code: CodeWidth = { large: 19, small: 18 }): LabelSpot {
  const thinned = rings.map(thinRing)
  const keepClear = [...thinned, ...others]
  const spots = roomySpots(thinned)
  for (const [form, least, height, beside] of [...FORMS, ['small', code.small, SMALL_HEIGHT, 0] as const]) {
    const width = form === 'small' ? least : Math.max(least, code.large + beside)
    const at = spots.find((spot) => rectangleFits(keepClear, spot, width / 2, height / 2))
    if (at !== undefined) return { form, at, orAt: null }
  }
  const { minX, minY, maxX, maxY } = boxOf(thinned[0] ?? [])
  const middle = (minX + maxX) / 2
  return { form: 'outside', at: [middle, minY - OUTSIDE_GAP], orAt: [middle, maxY + OUTSIDE_GAP] }
}

/** Candidate points inside, the ones farthest from any edge first. */
function roomySpots(rings: Rings): Pixel[] {
  const { minX, minY, maxX, maxY } = boxOf(rings[0] ?? [])
  const middle: Pixel = [(minX + maxX) / 2, (minY + maxY) / 2]
  const found: { at: Pixel; room: number }[] = []
  for (let column = 1; column < GRID; column += 1) {
    for (let row = 1; row < GRID; row += 1) {
      const at: Pixel = [minX + ((maxX - minX) * column) / GRID, minY + ((maxY - minY) * row) / GRID]
      if (!isInside(rings, at)) continue
      const fromMiddle = Math.hypot(at[0] - middle[0], at[1] - middle[1])
      found.push({ at, room: roomAt(rings, at) - fromMiddle * 0.15 })
    }
  }
  return found.sort((a, b) => b.room - a.room).map((spot) => spot.at)
}

/** Distance to the nearest edge; sideways counts less, for labels are wider than high. */
function roomAt(rings: Rings, [x, y]: Pixel): number {
  let least = Number.POSITIVE_INFINITY
  eachEdge(rings, (from, to) => {
    const [ax, ay, bx, by] = [(from[0] - x) * 0.7, from[1] - y, (to[0] - x) * 0.7, to[1] - y]
    const length = (bx - ax) ** 2 + (by - ay) ** 2
    const along = length === 0 ? 0 : Math.min(1, Math.max(0, -(ax * (bx - ax) + ay * (by - ay)) / length))
    least = Math.min(least, Math.hypot(ax + along * (bx - ax), ay + along * (by - ay)))
  })
  return least
}

function rectangleFits(rings: Rings, [x, y]: Pixel, halfWidth: number, halfHeight: number): boolean {
  return !hasEdgeIn(rings, { minX: x - halfWidth, minY: y - halfHeight, maxX: x + halfWidth, maxY: y + halfHeight })
}
