import type { Pixel } from '../../composables/map/mapTypes.ts'

/** Ground in pixels, its sides along the axes. */
export interface PixelBox { minX: number; minY: number; maxX: number; maxY: number }

/** Calls for every edge of the rings, the last edge of each going back to its first corner. */
export function eachEdge(rings: readonly (readonly Pixel[])[], visit: (from: Pixel, to: Pixel) => void): void {
  for (const ring of rings) {
    ring.forEach((from, index) => {
      const to = ring[(index + 1) % ring.length]
      if (to !== undefined) visit(from, to)
    })
  }
}

/** The least box around a ring, in pixels; inside out for a ring without corners. */
export function boxOf(ring: readonly Pixel[]): PixelBox {
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [x, y] of ring) {
    minX = Math.min(minX, x)
    minY = Math.min(minY, y)
    maxX = Math.max(maxX, x)
    maxY = Math.max(maxY, y)
  }
  return { minX, minY, maxX, maxY }
}
