import { metresPerDegree } from './ellipsoid.ts'
import type { Position } from './geometryTypes.ts'

/** Nearer to a pole a metre east means nothing. */
const MOST_LATITUDE = 89

/**
 * A position moved by metres east and north, along the ellipsoid's own radii there: for the short steps of a cross.
 * @returns [lon, lat] in degrees; latitude stays within 89 either way.
 */
export function movePosition([lon, lat]: Position, eastM: number, northM: number): Position {
  const { east, north } = metresPerDegree(lat)
  return [lon + eastM / east, Math.min(MOST_LATITUDE, Math.max(-MOST_LATITUDE, lat + northM / north))]
}
