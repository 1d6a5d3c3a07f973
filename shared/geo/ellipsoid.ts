/** WGS84: equatorial radius in metres and flattening. @source NIMA TR8350.2; EPSG 7030. */
const A_M = 6_378_137
const FLATTENING = 1 / 298.257223563
const E2 = FLATTENING * (2 - FLATTENING)
const E = Math.sqrt(E2)
export const RADIANS_PER_DEGREE = Math.PI / 180

/** `q` of the authalic latitude; at the pole it is twice the squared ratio of the authalic to the equatorial radius. */
const authalicQ = (sinLat: number): number =>
  (1 - E2) * (sinLat / (1 - E2 * sinLat * sinLat) + Math.atanh(E * sinLat) / E)
const Q_POLE = authalicQ(1)

/** Radius of the sphere with the ellipsoid's surface, 6 371 007.1809 m. */
export const AUTHALIC_RADIUS_M = A_M * Math.sqrt(Q_POLE / 2)

/**
 * Latitude on the authalic sphere that encloses the same area as a latitude on the ellipsoid.
 * @param lat degrees, −90 to 90. @returns degrees.
 * @source Snyder, Map Projections: A Working Manual (USGS Professional Paper 1395), equations 3-11 and 3-12.
 */
export function authalicLatitude(lat: number): number {
  const ratio = authalicQ(Math.sin(lat * RADIANS_PER_DEGREE)) / Q_POLE
  return Math.asin(Math.min(1, Math.max(-1, ratio))) / RADIANS_PER_DEGREE
}

/**
 * Metres along the ellipsoid for one degree north and one degree east at a latitude.
 * @param lat degrees. @source radii of curvature M and N (same paper, equations 4-18 and 4-20).
 */
export function metresPerDegree(lat: number): { north: number; east: number } {
  const sinLat = Math.sin(lat * RADIANS_PER_DEGREE)
  const w = 1 - E2 * sinLat * sinLat
  return {
    north: ((A_M * (1 - E2)) / (w * Math.sqrt(w))) * RADIANS_PER_DEGREE,
    east: (A_M / Math.sqrt(w)) * Math.cos(lat * RADIANS_PER_DEGREE) * RADIANS_PER_DEGREE,
  }
}
