import { distance } from '@turf/turf'
import type { Boundary, Position } from './geometryTypes.ts'
import { middleOf } from './middleOf.ts'

/**
 * Kilometres between the middles of two boundaries, or points, along the great circle of the mean sphere (within 0.6 %).
 */
export function distanceKm(a: Boundary | Position, b: Boundary | Position): number {
  return distance(toPoint(a), toPoint(b), { units: 'kilometers' })
}

const toPoint = (place: Boundary | Position): Position => (Array.isArray(place) ? place : middleOf(place))
