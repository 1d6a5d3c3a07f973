import type { GridRing } from './gridRing.ts'
import type { Segment } from './gridSegments.ts'

/** Edges of a ring in flat arrays, for loops over millions of pairs: edge i runs from point i to the next. */
export interface GridEdges {
  segments: Segment[]
  west: Float64Array
  east: Float64Array
  south: Float64Array
  north: Float64Array
}

/** The edges of a ring with their spans, grid units. */
export function toGridEdges({ x, y }: GridRing): GridEdges {
  const segments = x.map((ax, index): Segment => {
    const next = (index + 1) % x.length
    return { ax, ay: y[index] ?? 0, bx: x[next] ?? 0, by: y[next] ?? 0 }
  })
  return {
    segments,
    west: Float64Array.from(segments, ({ ax, bx }) => Math.min(ax, bx)),
    east: Float64Array.from(segments, ({ ax, bx }) => Math.max(ax, bx)),
    south: Float64Array.from(segments, ({ ay, by }) => Math.min(ay, by)),
    north: Float64Array.from(segments, ({ ay, by }) => Math.max(ay, by)),
  }
}
