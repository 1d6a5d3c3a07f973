import { offsetFromEdge } from './edgeOffset.ts'
import type { GridPoint } from './gridPoints.ts'
import { gridScaleAt } from './localPlane.ts'

/** An edge that gets a new corner near a point. */
export interface EdgeToCut { a: GridPoint; b: GridPoint; near: GridPoint }
/** The new corner; a second one beside it, towards b, where the first alone would change the area. */
export type NewCorners = readonly [GridPoint] | readonly [GridPoint, GridPoint]

/** Grid units to either side that a corner may move along its edge: about a decimetre. */
const REACH = 10

interface Candidate { at: GridPoint; areaM2: number }

/**
 * Corners on edges so that the ground on both sides of them stays what it was: coordinates are kept to 1e-7 degrees, and a corner
 * half a centimetre off an edge of 100 m would add or take 0.25 m². Each corner is sought within a decimetre, and those of several
 * edges so that what they add and take makes up for one another.
 * @param edges of one outline, each edge once. @param tolerance what may stay, square metres.
 */
export function setCorners(edges: readonly EdgeToCut[], toleranceM2: number): NewCorners[] {
  const choices = edges.map(candidatesOf)
  const chosen = choices.map((list) => best(list, 0))
  const sum = (): number => chosen.reduce((total, { areaM2 }) => total + areaM2, 0)
  const last = chosen.length - 1
  for (let other = 0; other < last && Math.abs(sum()) > toleranceM2; other += 1) {
    const rest = sum() - (chosen[other]?.areaM2 ?? 0) - (chosen[last]?.areaM2 ?? 0)
    const pairs = (choices[other] ?? []).map((first) => ({ first, second: best(choices[last] ?? [], rest + first.areaM2) }))
    const pair = pairs.reduce((least, each) => (leftOf(each) < leftOf(least) ? each : least))
    chosen[other] = pair.first
    chosen[last] = pair.second
    function leftOf({ first, second }: (typeof pairs)[number]): number { return Math.abs(rest + first.areaM2 + second.areaM2) }
  }
  const corners: NewCorners[] = chosen.map(({ at }) => [at])
  const lastEdge = edges[last]
  if (lastEdge !== undefined && Math.abs(sum()) > toleranceM2) {
    corners[last] = bestTwo(lastEdge, choices[last] ?? [], sum() - (chosen[last]?.areaM2 ?? 0))
  }
  return corners
}

/** The candidate that leaves the least beside what is there already; of equals the first. */
function best(candidates: readonly Candidate[], restM2: number): Candidate {
  return candidates.reduce((least, each) => (Math.abs(restM2 + each.areaM2) < Math.abs(restM2 + least.areaM2) ? each : least))
}

/** Two corners on one edge that together leave the least. */
function bestTwo({ b }: EdgeToCut, candidates: readonly Candidate[], restM2: number): NewCorners {
  const tries = candidates.map((first) => {
    const second = best(candidatesOf({ a: first.at, b, near: first.at }), restM2 + first.areaM2)
    return { corners: [first.at, second.at] as const, leftM2: Math.abs(restM2 + first.areaM2 + second.areaM2) }
  })
  return tries.reduce((least, each) => (each.leftM2 < least.leftM2 ? each : least)).corners
}

/** Grid points beside an edge near a place on it, nearest first, with what the ground left of the edge loses through each. */
function candidatesOf({ a, b, near }: EdgeToCut): Candidate[] {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const isFlat = Math.abs(dx) >= Math.abs(dy)
  const [start, end, middle] = isFlat ? [a[0], b[0], near[0]] : [a[1], b[1], near[1]]
  const scale = gridScaleAt(a)
  const halfStripM2 = (Math.abs(end - start) * scale.east * scale.north) / 2
  const candidates: Candidate[] = []
  for (let step = 0; step <= 2 * REACH; step += 1) {
    const along = Math.round(middle) + (step % 2 === 0 ? step / 2 : -(step + 1) / 2)
    if (along <= Math.min(start, end) || along >= Math.max(start, end)) continue
    for (const at of rowsAt(a, b, along, isFlat)) candidates.push({ at, areaM2: offsetFromEdge(a, b, at) * halfStripM2 })
  }
  return candidates.length > 0 ? candidates : [{ at: [Math.round(near[0]), Math.round(near[1])], areaM2: 0 }]
}

/** The two grid points on either side of the edge at a place along it. */
function rowsAt(a: GridPoint, b: GridPoint, along: number, isFlat: boolean): GridPoint[] {
  const share = isFlat ? (along - a[0]) / (b[0] - a[0]) : (along - a[1]) / (b[1] - a[1])
  const straight = isFlat ? a[1] + share * (b[1] - a[1]) : a[0] + share * (b[0] - a[0])
  const row = Math.round(straight)
  const guess: GridPoint = isFlat ? [along, row] : [row, along]
  const off = offsetFromEdge(a, b, guess) * (isFlat ? Math.sign(b[0] - a[0]) : -Math.sign(b[1] - a[1]))
  const exact = row - off
  return [Math.floor(exact), Math.ceil(exact)].map((across): GridPoint => (isFlat ? [along, across] : [across, along]))
}
