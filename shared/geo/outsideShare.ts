import { findOverlaps } from './findOverlaps.ts'
import type { Boundary } from './geometryTypes.ts'
import { measurePolygon } from './measurePolygon.ts'

/** A drawn part may lie this share beyond its block: a shaky finger, not another field. */
export const MOST_OUTSIDE = 0.02

/** How much of a part lies outside its block, 0 to 1; 0 where the two are too fine to clip. Both are valid boundaries. */
export function outsideShare(part: Boundary, block: Boundary): number {
  const { overlaps, tooFine } = findOverlaps(part, [{ id: '', code: '', geometry: block }])
  if (tooFine.length > 0) return 0
  return Math.max(0, 1 - (overlaps[0]?.areaM2 ?? 0) / measurePolygon(part).areaM2)
}
