import { lineString, simplify } from '@turf/turf'
import { metresPerDegree } from '../geo/ellipsoid.ts'
import { countPoints } from './countPoints.ts'

/** Outlines of more points than this are offered thinned: a walked or flown line, not a surveyed one. */
export const FINE_POINTS = 300

/**
 * An outline with the points left out that lie within a tolerance of the line without them (Douglas and Peucker); others keep
 * their place. A ring that would be no ring any more stays as it is, and so does whatever is not made of numbers.
 * @param geometry GeoJSON polygon or several, closed, in degrees; not yet judged.
 * @param toleranceM farthest in metres that the line may move.
 */
export function thinOutline(geometry: unknown, toleranceM: number): unknown {
  if (toleranceM <= 0 || countPoints(geometry) <= FINE_POINTS) return geometry
  const { type, coordinates } = geometry as { type: string; coordinates: unknown }
  if (type === 'Polygon') return { type, coordinates: (coordinates as unknown[][]).map((ring) => thinRing(ring, toleranceM)) }
  return { type, coordinates: (coordinates as unknown[][][]).map((rings) => rings.map((ring) => thinRing(ring, toleranceM))) }
}

function thinRing(ring: unknown[], toleranceM: number): unknown[] {
  const places = ring.flatMap((position): [number, number][] => {
    const [lon, lat] = Array.isArray(position) ? (position as unknown[]) : []
    return isDegrees(lon, 180) && isDegrees(lat, 90) ? [[lon, lat]] : []
  })
  const middle = places[Math.floor(places.length / 2)]
  if (middle === undefined || places.length !== ring.length || places.length < 4) return ring
  // In metres both ways, or a tolerance would be wider northward than eastward.
  const { east, north } = metresPerDegree(middle[1])
  const plan = lineString(places.map(([lon, lat]) => [lon * east, lat * north]))
  const kept = simplify(plan, { tolerance: toleranceM, highQuality: true }).geometry.coordinates
  const thinned = kept.map(([x = 0, y = 0]): [number, number] => [x / east, y / north])
  return thinned.length < 4 ? ring : thinned
}

const isDegrees = (value: unknown, most: number): value is number => typeof value === 'number' && Math.abs(value) <= most
