import { edgeChangeM2 } from './edgeOffset.ts'
import type { GridPoint } from './gridPoints.ts'

const MOST_TRIES = 30

/**
 * One or two corners to set on the edge from a to b, each within a grid unit of it, that change the ground beside it by a small area:
 * a flat triangle over as much of the edge as it takes. None where that is less than half of what a grid triangle has.
 * @param areaM2 to add on the left of a→b, negative to take. @param unitM2 area of one grid unit.
 */
export function bumpEdge(a: GridPoint, b: GridPoint, areaM2: number, unitM2: number): GridPoint[] {
  let best: { corners: GridPoint[]; missing: number } = { corners: [], missing: Infinity }
  let wanted = (2 * areaM2) / unitM2
  // The edge is measured along the great circle: what the corners change there is worked out and made up for. The tip of the next
  // triangle may stand elsewhere on the edge, so that the last one need not be the best.
  for (let attempt = 0; attempt < MOST_TRIES && Math.abs(best.missing) >= 1; attempt += 1) {
    const corners = flatTriangle(a, b, Math.round(wanted))
    const missing = (2 * (areaM2 - changeOf(a, b, corners))) / unitM2
    if (Math.abs(missing) < Math.abs(best.missing)) best = { corners, missing }
    wanted += missing * 0.8
  }
  return best.corners
}

function changeOf(a: GridPoint, b: GridPoint, [first, second]: GridPoint[]): number {
  if (first === undefined) return 0
  return second === undefined ? edgeChangeM2(a, b, first) : edgeChangeM2(a, b, second) + edgeChangeM2(a, second, first)
}

/**
 * Corners of a triangle on a→b with twice this area in grid units, above 0 to the left. The edge is so many steps of its smallest whole
 * vector; the triangle stands on some of those steps, its tip beside the line by the share of a unit that is needed.
 */
function flatTriangle(a: GridPoint, b: GridPoint, twice: number): GridPoint[] {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const steps = greatestDivisor(Math.abs(dx), Math.abs(dy))
  if (twice === 0 || steps === 0) return []
  const step: GridPoint = [dx / steps, dy / steps]
  const mostOff = Math.max(Math.abs(step[0]), Math.abs(step[1]))
  const base = Math.min(steps, Math.ceil(Math.abs(twice) / mostOff))
  const off = Math.round(twice / base)
  const beside = besideBy(step, off)
  const middle = Math.floor(base / 2)
  const tip: GridPoint = [a[0] + beside[0] + middle * step[0], a[1] + beside[1] + middle * step[1]]
  return base === steps ? [tip] : [tip, [a[0] + base * step[0], a[1] + base * step[1]]]
}

function greatestDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestDivisor(b, a % b)
}

/** The whole vector v with step × v = off that lies along the step, between its start and its end. */
function besideBy(step: GridPoint, off: number): GridPoint {
  const [x, y] = bezout(step[0], step[1])
  // step × (−y, x) = 1; whole steps may be taken from it without changing that.
  const [vx, vy] = [-y * off, x * off]
  const length = step[0] * step[0] + step[1] * step[1]
  const back = Math.floor((vx * step[0] + vy * step[1]) / length)
  return [vx - back * step[0] + 0, vy - back * step[1] + 0]
}

/** Whole x and y with p·x + q·y = 1, for p and q without a common divisor. */
function bezout(p: number, q: number): [number, number] {
  let [r0, r1, x0, x1, y0, y1] = [p, q, 1, 0, 0, 1]
  while (r1 !== 0) {
    const times = Math.trunc(r0 / r1)
    ;[r0, r1] = [r1, r0 - times * r1]
    ;[x0, x1] = [x1, x0 - times * x1]
    ;[y0, y1] = [y1, y0 - times * y1]
  }
  return r0 < 0 ? [-x0, -y0] : [x0, y0]
}
