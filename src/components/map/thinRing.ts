import type { Pixel } from '../../composables/map/mapTypes.ts'

const MOST_POINTS = 240

/** A ring with at most some 240 of its corners: enough to place a label by. */
export function thinRing(ring: readonly Pixel[]): readonly Pixel[] {
  const step = Math.ceil(ring.length / MOST_POINTS)
  return step <= 1 ? ring : ring.filter((_, index) => index % step === 0)
}
