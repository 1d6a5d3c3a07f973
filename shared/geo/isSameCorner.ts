import type { Position } from './geometryTypes.ts'

/** 0.2 m along a meridian, in degrees. */
const NEAR_DEGREES = 1.8e-6

/** Whether two corners lie within about 0.2 m of each other: a finger's second touch, not a corner. */
export function isSameCorner([lon, lat]: Position, [otherLon, otherLat]: Position): boolean {
  const narrowing = Math.cos((lat * Math.PI) / 180)
  return Math.hypot((lon - otherLon) * narrowing, lat - otherLat) < NEAR_DEGREES
}
