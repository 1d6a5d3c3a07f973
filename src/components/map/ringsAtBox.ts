import type { Pixel } from '../../composables/map/mapTypes.ts'
import { eachEdge, type PixelBox } from './pixelRing.ts'

type Rings = readonly (readonly Pixel[])[]

/** Whether a point lies in a polygon; its holes do not count as inside. */
export function isInside(rings: Rings, [x, y]: Pixel): boolean {
  let inside = false
  eachEdge(rings, (from, to) => {
    const straddles = from[1] > y !== to[1] > y
    if (straddles && x < from[0] + ((y - from[1]) / (to[1] - from[1])) * (to[0] - from[0])) inside = !inside
  })
  return inside
}

/** Whether an edge of the rings touches a box. */
export function hasEdgeIn(rings: Rings, box: PixelBox): boolean {
  return rings.some((ring) =>
    ring.some((from, index) => crossesBox(from, ring[(index + 1) % ring.length] ?? from, box)),
  )
}

/** Whether any of the polygons shares ground with a box. */
export function coversBox(polygons: readonly Rings[], box: PixelBox): boolean {
  // Without an edge in the box, one point of it speaks for all of it.
  return polygons.some((rings) => hasEdgeIn(rings, box) || isInside(rings, [box.minX, box.minY]))
}

/** Whether a segment touches a box (clipping the segment by each side in turn). */
function crossesBox(from: Pixel, to: Pixel, { minX, minY, maxX, maxY }: PixelBox): boolean {
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
