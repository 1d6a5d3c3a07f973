import { toGridEdges } from './gridEdges.ts'
import type { GridRing } from './gridRing.ts'
import { crossesProperly, sideOf, type Segment } from './gridSegments.ts'

/** `within`: a lies in b, touching allowed. `around`: b lies in a. */
export type RingRelation = 'apart' | 'within' | 'around' | 'crossing'

/** How two simple rings lie to each other; rings that only touch are apart. */
export function relateRings(a: GridRing, b: GridRing): RingRelation {
  if (areBoxesApart(a, b)) return 'apart'
  if (hasProperCrossing(a, b)) return 'crossing'
  const ofA = countSides(a, b)
  if (ofA.inside > 0 && ofA.outside > 0) return 'crossing'
  if (ofA.inside > 0) return 'within'
  const ofB = countSides(b, a)
  if (ofB.inside > 0) return ofB.outside > 0 ? 'crossing' : 'around'
  // Corners all on each other's edges: a point of the inner ground decides.
  const inner = innerPoint(ofA.outside === 0 ? a : b)
  const isInside = placeOf(ofA.outside === 0 ? b : a, inner[0], inner[1]) > 0
  if (!isInside) return 'apart'
  return ofA.outside === 0 ? 'within' : 'around'
}

/** Corners of a ring inside and outside another; where an edge has both ends on the other, its middle counts instead. */
function countSides(ring: GridRing, other: GridRing): { inside: number; outside: number } {
  const places = ring.x.map((x, index) => placeOf(other, x, ring.y[index] ?? 0))
  const middles = toGridEdges(ring).segments.map(({ ax, ay, bx, by }, index) => {
    const next = places[(index + 1) % places.length]
    return places[index] === 0 && next === 0 ? placeOf(other, (ax + bx) / 2, (ay + by) / 2) : 0
  })
  const all = [...places, ...middles]
  return { inside: all.filter((place) => place > 0).length, outside: all.filter((place) => place < 0).length }
}

/** Above 0 inside, below 0 outside, 0 on the ring. */
export function placeOf({ x, y }: GridRing, px: number, py: number): number {
  let isInside = false
  for (let index = 0, before = x.length - 1; index < x.length; before = index, index += 1) {
    const ay = y[before] ?? 0
    const by = y[index] ?? 0
    if ((ay < py && by < py) || (ay > py && by > py)) continue
    const edge: Segment = { ax: x[before] ?? 0, ay, bx: x[index] ?? 0, by }
    const side = sideOf(edge, px, py)
    if (side === 0 && px >= Math.min(edge.ax, edge.bx) && px <= Math.max(edge.ax, edge.bx)) return 0
    if (ay > py !== by > py && side > 0 === by > ay) isInside = !isInside
  }
  return isInside ? 1 : -1
}

/** A point strictly inside: halfway between the first two crossings of a level line that meets no corner. */
function innerPoint({ x, y }: GridRing): readonly [number, number] {
  const levels = [...new Set(y)].sort((p, q) => p - q)
  const level = ((levels[0] ?? 0) + (levels[1] ?? 0)) / 2
  const crossings: number[] = []
  for (let index = 0, before = x.length - 1; index < x.length; before = index, index += 1) {
    const [ax = 0, ay = 0, bx = 0, by = 0] = [x[before], y[before], x[index], y[index]]
    if (ay > level !== by > level) crossings.push(ax + ((level - ay) / (by - ay)) * (bx - ax))
  }
  crossings.sort((p, q) => p - q)
  return [((crossings[0] ?? 0) + (crossings[1] ?? 0)) / 2, level]
}

function hasProperCrossing(a: GridRing, b: GridRing): boolean {
  const edgesA = toGridEdges(a)
  const edgesB = toGridEdges(b)
  return edgesA.segments.some((segment, i) => {
    const [west = 0, east = 0, south = 0, north = 0] = [edgesA.west[i], edgesA.east[i], edgesA.south[i], edgesA.north[i]]
    for (let j = 0; j < edgesB.segments.length; j += 1) {
      if ((edgesB.west[j] ?? 0) > east || (edgesB.east[j] ?? 0) < west || (edgesB.south[j] ?? 0) > north || (edgesB.north[j] ?? 0) < south) continue
      const other = edgesB.segments[j]
      if (other && crossesProperly(segment, other)) return true
    }
    return false
  })
}

function areBoxesApart(a: GridRing, b: GridRing): boolean {
  return (
    Math.max(...a.x) < Math.min(...b.x) || Math.max(...b.x) < Math.min(...a.x) ||
    Math.max(...a.y) < Math.min(...b.y) || Math.max(...b.y) < Math.min(...a.y)
  )
}
