import { toGridEdges, type GridEdges } from './gridEdges.ts'
import type { GridRing } from './gridRing.ts'
import { sharedPoint } from './gridSegments.ts'

/** Where a ring meets itself: the point in grid units, and the two edges, counted from 1 at the first point. */
export interface SelfContact { x: number; y: number; edgeA: number; edgeB: number }

/**
 * Where edges of a ring that are not neighbours cross or touch; of several the first from the west (from the south where the ring
 * is swept that way), so that the answer does not depend on where the ring starts or which way it runs.
 * A sweep along the axis on which edges are shorter, that compares only edges whose spans overlap.
 */
export function findSelfContact(ring: GridRing): SelfContact | null {
  if (relativeSpan(ring.x) <= relativeSpan(ring.y)) return sweep(ring)
  const turned = sweep({ x: ring.y, y: ring.x })
  return turned && { ...turned, x: turned.y, y: turned.x }
}

/** Length of all edges along one axis over the extent of the ring there. */
function relativeSpan(values: readonly number[]): number {
  const length = values.reduce((sum, value, index) => sum + Math.abs(value - (values[(index + 1) % values.length] ?? value)), 0)
  return length / (Math.max(...values) - Math.min(...values))
}

function sweep(ring: GridRing): SelfContact | null {
  const edges = toGridEdges(ring)
  const order = Uint32Array.from(edges.segments, (_, index) => index).sort((a, b) => at(edges.west, a) - at(edges.west, b))
  const active = new Uint32Array(order.length)
  let activeCount = 0
  let best: SelfContact | null = null
  for (const index of order) {
    const from = at(edges.west, index)
    if (best !== null && from > best.x) break
    let kept = 0
    for (let place = 0; place < activeCount; place += 1) {
      const other = at(active, place)
      if (at(edges.east, other) < from) continue
      active[kept] = other
      kept += 1
      if (at(edges.south, other) > at(edges.north, index) || at(edges.north, other) < at(edges.south, index)) continue
      const contact = contactOf(edges, index, other)
      if (contact && isBefore(contact, best)) best = contact
    }
    active[kept] = index
    activeCount = kept + 1
  }
  return best
}

function contactOf({ segments }: GridEdges, i: number, j: number): SelfContact | null {
  const apart = Math.abs(i - j)
  const a = segments[i]
  const b = segments[j]
  if (apart === 1 || apart === segments.length - 1 || !a || !b) return null
  const point = sharedPoint(a, b)
  return point && { x: point[0], y: point[1], edgeA: Math.min(i, j) + 1, edgeB: Math.max(i, j) + 1 }
}

function isBefore(a: SelfContact, b: SelfContact | null): boolean {
  return b === null || a.x < b.x || (a.x === b.x && a.y < b.y)
}

const at = (values: Float64Array | Uint32Array, index: number): number => values[index] ?? 0
