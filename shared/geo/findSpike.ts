import { metresPerDegree } from './ellipsoid.ts'
import { GRID_PER_DEGREE, type GridRing } from './gridRing.ts'

/** The arms of a spike lie closer than this, metres: about two units of the coordinates kept. */
const SPIKE_WIDTH_M = 0.02
/** Shorter arms are the jitter of a receiver, not a spike, unless they lie exactly on each other. */
const SPIKE_LENGTH_M = 0.5

/**
 * The point, in grid units, where a ring runs out and straight back on itself; of several the westernmost, then southernmost.
 */
export function findSpike({ x, y }: GridRing): { x: number; y: number } | null {
  const metres = metresPerDegree((y[0] ?? 0) / GRID_PER_DEGREE)
  const count = x.length
  let best: { x: number; y: number } | null = null
  for (let index = 0; index < count; index += 1) {
    const tipX = x[index] ?? 0
    const tipY = y[index] ?? 0
    const before = (index + count - 1) % count
    const after = (index + 1) % count
    const a: Arm = [(x[before] ?? 0) - tipX, (y[before] ?? 0) - tipY]
    const b: Arm = [(x[after] ?? 0) - tipX, (y[after] ?? 0) - tipY]
    if (!isSpike(a, b, metres)) continue
    if (best === null || tipX < best.x || (tipX === best.x && tipY < best.y)) best = { x: tipX, y: tipY }
  }
  return best
}

type Arm = readonly [number, number]

function isSpike(a: Arm, b: Arm, metres: { north: number; east: number }): boolean {
  if (a[0] * b[0] + a[1] * b[1] <= 0) return false
  if (a[0] * b[1] - a[1] * b[0] === 0) return true
  const [ax, ay] = [(a[0] * metres.east) / GRID_PER_DEGREE, (a[1] * metres.north) / GRID_PER_DEGREE]
  const [bx, by] = [(b[0] * metres.east) / GRID_PER_DEGREE, (b[1] * metres.north) / GRID_PER_DEGREE]
  const lengths = [Math.hypot(ax, ay), Math.hypot(bx, by)]
  const width = Math.abs(ax * by - ay * bx) / Math.max(...lengths)
  return Math.min(...lengths) > SPIKE_LENGTH_M && width < SPIKE_WIDTH_M
}
