import { bumpEdge } from './bumpEdge.ts'
import type { GridPoint } from './gridPoints.ts'
import { gridScaleAt } from './localPlane.ts'
import { bestPlace, placesOnGrid, type GridPlace } from './nearestOnGrid.ts'

/** An edge that gets a new corner near a point; `more` where another one follows on it. */
export interface EdgeToCut { a: GridPoint; b: GridPoint; near: GridPoint; more: boolean }
/** The new corner, and those beside it that make up for what it adds or takes, in the order of the edge. */
export interface NewCorner { before: GridPoint[]; at: GridPoint; after: GridPoint[] }

/**
 * Corners on edges so that the ground on both sides of them stays what it was: coordinates are kept to 1e-7 degrees, and a corner
 * half a centimetre off an edge of 100 m would add or take 0.25 m². Each corner is sought within a decimetre, and those of several
 * edges so that what they add and take makes up for one another; what is then still too much is made up for by a corner or two more
 * on the same edge, within a grid unit of it.
 * @param edges of one outline, each edge once. @param toleranceM2 what may stay, square metres.
 */
export function setCorners(edges: readonly EdgeToCut[], toleranceM2: number): NewCorner[] {
  const chosen = choosePairs(edges.map(({ a, b, near }) => placesOnGrid(a, b, near)), toleranceM2)
  const isEnough = Math.abs(sumM2(chosen)) <= toleranceM2
  return edges.map((edge, index): NewCorner => {
    const { at, areaM2 } = chosen[index] ?? { at: edge.near, areaM2: 0 }
    return isEnough ? { before: [], at, after: [] } : makeUpFor(edge, at, areaM2)
  })
}

/** For each edge a place; the nearest ones where their changes make up for one another as they are. */
function choosePairs(choices: readonly GridPlace[][], toleranceM2: number): GridPlace[] {
  const nearest = choices.map((list) => bestPlace(list.slice(0, 2), 0))
  if (Math.abs(sumM2(nearest)) <= toleranceM2) return nearest
  const chosen = choices.map((list) => bestPlace(list, 0, toleranceM2 / choices.length))
  const sum = (): number => sumM2(chosen)
  const last = chosen.length - 1
  for (let other = 0; other < last && Math.abs(sum()) > toleranceM2; other += 1) {
    const restM2 = sum() - (chosen[other]?.areaM2 ?? 0) - (chosen[last]?.areaM2 ?? 0)
    const pairs = (choices[other] ?? []).map((first) => {
      const second = bestPlace(choices[last] ?? [], restM2 + first.areaM2, toleranceM2)
      return { first, second, leftM2: Math.max(Math.abs(restM2 + first.areaM2 + second.areaM2), toleranceM2) }
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

const sumM2 = (places: readonly GridPlace[]): number => places.reduce((total, { areaM2 }) => total + areaM2, 0)
const lengthOf = (a: GridPoint, b: GridPoint): number => Math.max(Math.abs(b[0] - a[0]), Math.abs(b[1] - a[1]))
