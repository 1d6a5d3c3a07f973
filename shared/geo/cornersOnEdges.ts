import { bumpEdge } from './bumpEdge.ts'
import { edgeChangeM2, offsetFromEdge } from './edgeOffset.ts'
import type { GridPoint } from './gridPoints.ts'
import { gridScaleAt } from './localPlane.ts'

/** An edge that gets a new corner near a point; `more` where another one follows on it. */
export interface EdgeToCut { a: GridPoint; b: GridPoint; near: GridPoint; more: boolean }
/** The new corner, and those beside it that make up for what it adds or takes, in the order of the edge. */
export interface NewCorner { before: GridPoint[]; at: GridPoint; after: GridPoint[] }

/** Grid units to either side that a corner may move along its edge: about a decimetre. */
const REACH = 10

interface Candidate { at: GridPoint; areaM2: number }

/**
 * Corners on edges so that the ground on both sides of them stays what it was: coordinates are kept to 1e-7 degrees, and a corner
 * half a centimetre off an edge of 100 m would add or take 0.25 m². Each corner is sought within a decimetre, and those of several
 * edges so that what they add and take makes up for one another; what is then still too much is made up for by a corner or two more
 * on the same edge, within a grid unit of it.
 * @param edges of one outline, each edge once. @param toleranceM2 what may stay, square metres.
 */
export function setCorners(edges: readonly EdgeToCut[], toleranceM2: number): NewCorner[] {
  const chosen = choosePairs(edges.map(candidatesOf), toleranceM2)
  const sumM2 = chosen.reduce((total, { areaM2 }) => total + areaM2, 0)
  const isEnough = Math.abs(sumM2) <= toleranceM2
  return edges.map((edge, index): NewCorner => {
    const { at, areaM2 } = chosen[index] ?? { at: edge.near, areaM2: 0 }
    return isEnough ? { before: [], at, after: [] } : makeUpFor(edge, at, areaM2)
  })
}

function choosePairs(choices: readonly Candidate[][], toleranceM2: number): Candidate[] {
  const chosen = choices.map((list) => best(list, 0))
  const sum = (): number => chosen.reduce((total, { areaM2 }) => total + areaM2, 0)
  const last = chosen.length - 1
  for (let other = 0; other < last && Math.abs(sum()) > toleranceM2; other += 1) {
    const restM2 = sum() - (chosen[other]?.areaM2 ?? 0) - (chosen[last]?.areaM2 ?? 0)
    const pairs = (choices[other] ?? []).map((first) => {
      const second = best(choices[last] ?? [], restM2 + first.areaM2)
      return { first, second, leftM2: Math.abs(restM2 + first.areaM2 + second.areaM2) }
    })
    const pair = pairs.reduce((least, each) => (each.leftM2 < least.leftM2 ? each : least))
    chosen[other] = pair.first
    chosen[last] = pair.second
  }
  return chosen
}

/** A corner with others on the longer side of its edge; before it where more corners follow. */
function makeUpFor({ a, b, more }: EdgeToCut, at: GridPoint, areaM2: number): NewCorner {
  const scale = gridScaleAt(a)
  const unitM2 = scale.east * scale.north
  const isBefore = more || lengthOf(a, at) > lengthOf(at, b)
  return isBefore ? { before: bumpEdge(a, at, -areaM2, unitM2), at, after: [] } : { before: [], at, after: bumpEdge(at, b, -areaM2, unitM2) }
}

const lengthOf = (a: GridPoint, b: GridPoint): number => Math.max(Math.abs(b[0] - a[0]), Math.abs(b[1] - a[1]))

/** The candidate that leaves the least beside what is there already; of equals the first. */
function best(candidates: readonly Candidate[], restM2: number): Candidate {
  return candidates.reduce((least, each) => (Math.abs(restM2 + each.areaM2) < Math.abs(restM2 + least.areaM2) ? each : least))
}

/** Grid points beside an edge near a place on it, nearest first, with what each changes. */
function candidatesOf({ a, b, near }: EdgeToCut): Candidate[] {
  const isFlat = Math.abs(b[0] - a[0]) >= Math.abs(b[1] - a[1])
  const [start, end, middle] = isFlat ? [a[0], b[0], near[0]] : [a[1], b[1], near[1]]
  const candidates: Candidate[] = []
  for (let step = 0; step <= 2 * REACH; step += 1) {
    const along = Math.round(middle) + (step % 2 === 0 ? step / 2 : -(step + 1) / 2)
    if (along <= Math.min(start, end) || along >= Math.max(start, end)) continue
    for (const at of rowsAt(a, b, along, isFlat)) candidates.push({ at, areaM2: edgeChangeM2(a, b, at) })
  }
  return candidates.length > 0 ? candidates : [{ at: [Math.round(near[0]), Math.round(near[1])], areaM2: 0 }]
}

/** The two grid points on either side of the edge at a place along it. */
function rowsAt(a: GridPoint, b: GridPoint, along: number, isFlat: boolean): GridPoint[] {
  const share = isFlat ? (along - a[0]) / (b[0] - a[0]) : (along - a[1]) / (b[1] - a[1])
  const row = Math.round(isFlat ? a[1] + share * (b[1] - a[1]) : a[0] + share * (b[0] - a[0]))
  const guess: GridPoint = isFlat ? [along, row] : [row, along]
  const off = offsetFromEdge(a, b, guess) * (isFlat ? Math.sign(b[0] - a[0]) : -Math.sign(b[1] - a[1]))
  const exact = row - off
  return [Math.floor(exact), Math.ceil(exact)].map((across): GridPoint => (isFlat ? [along, across] : [across, along]))
}
