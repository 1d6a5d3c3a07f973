import type { Pixel } from '../../composables/mapTypes.ts'

/** How much of a label has room in its block. */
export type LabelForm = 'full' | 'narrow' | 'slip' | 'code' | 'outside'
export interface LabelSpot {
  form: LabelForm
  at: Pixel
}

/** Width and height in pixels that each form needs, best form first. */
const FORMS: readonly (readonly [LabelForm, number, number])[] = [
  ['full', 58, 40],
  ['narrow', 27, 36],
  ['slip', 50, 20],
  ['code', 22, 18],
]
const GRID = 17
const MOST_POINTS = 240
const OUTSIDE_GAP = 9

/**
 * Where in a block its label stands, and in which form.
 * @param rings the rings of one polygon in pixels, outer first; holes are kept clear.
 * @returns the roomiest point for the first form that fits, or a point over the block's top where none does.
 */
export function labelSpot(rings: readonly (readonly Pixel[])[]): LabelSpot {
  const thinned = rings.map(thin)
  const spots = roomySpots(thinned)
  for (const [form, width, height] of FORMS) {
    const at = spots.find((spot) => rectangleFits(thinned, spot, width / 2, height / 2))
    if (at !== undefined) return { form, at }
  }
  return { form: 'outside', at: overTheTop(thinned[0] ?? []) }
}

/** Candidate points inside, the ones farthest from any edge first. */
function roomySpots(rings: readonly (readonly Pixel[])[]): Pixel[] {
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
function roomAt(rings: readonly (readonly Pixel[])[], [x, y]: Pixel): number {
  let least = Number.POSITIVE_INFINITY
  eachEdge(rings, (from, to) => {
    const [ax, ay, bx, by] = [(from[0] - x) * 0.7, from[1] - y, (to[0] - x) * 0.7, to[1] - y]
    const length = (bx - ax) ** 2 + (by - ay) ** 2
    const along = length === 0 ? 0 : Math.min(1, Math.max(0, -(ax * (bx - ax) + ay * (by - ay)) / length))
    least = Math.min(least, Math.hypot(ax + along * (bx - ax), ay + along * (by - ay)))
  })
  return least
}

function rectangleFits(rings: readonly (readonly Pixel[])[], [x, y]: Pixel, halfWidth: number, halfHeight: number): boolean {
  let free = true
  eachEdge(rings, (from, to) => {
    if (free && crossesBox(from, to, x - halfWidth, y - halfHeight, x + halfWidth, y + halfHeight)) free = false
  })
  return free
}

/** Whether a segment touches a box (clipping the segment by each side in turn). */
function crossesBox(from: Pixel, to: Pixel, minX: number, minY: number, maxX: number, maxY: number): boolean {
  let enter = 0
  let leave = 1
  const steps = [to[0] - from[0], to[1] - from[1]] as const
  const bounds = [[minX, maxX, from[0], steps[0]], [minY, maxY, from[1], steps[1]]] as const
  for (const [low, high, start, step] of bounds) {
    if (step === 0) {
      if (start < low || start > high) return false
      continue
    }
    const first = (low - start) / step
    const second = (high - start) / step
    enter = Math.max(enter, Math.min(first, second))
    leave = Math.min(leave, Math.max(first, second))
    if (enter > leave) return false
  }
  return true
}

function isInside(rings: readonly (readonly Pixel[])[], [x, y]: Pixel): boolean {
  let inside = false
  eachEdge(rings, (from, to) => {
    const straddles = from[1] > y !== to[1] > y
    if (straddles && x < from[0] + ((y - from[1]) / (to[1] - from[1])) * (to[0] - from[0])) inside = !inside
  })
  return inside
}

function eachEdge(rings: readonly (readonly Pixel[])[], visit: (from: Pixel, to: Pixel) => void): void {
  for (const ring of rings) {
    ring.forEach((from, index) => {
      const to = ring[(index + 1) % ring.length]
      if (to !== undefined) visit(from, to)
    })
  }
}

function overTheTop(ring: readonly Pixel[]): Pixel {
  const { minX, minY, maxX } = boxOf(ring)
  return [(minX + maxX) / 2, minY - OUTSIDE_GAP]
}

function boxOf(ring: readonly Pixel[]): { minX: number; minY: number; maxX: number; maxY: number } {
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [x, y] of ring) {
    minX = Math.min(minX, x)
    minY = Math.min(minY, y)
    maxX = Math.max(maxX, x)
    maxY = Math.max(maxY, y)
  }
  return { minX, minY, maxX, maxY }
}

function thin(ring: readonly Pixel[]): readonly Pixel[] {
  const step = Math.ceil(ring.length / MOST_POINTS)
  return step <= 1 ? ring : ring.filter((_, index) => index % step === 0)
}
