import type { GeometryFinding, Ring } from './geometryTypes.ts'

/** Degrees in whole units of 1e-7: sums and products of a field's differences stay exact in doubles. */
export const GRID_PER_DEGREE = 1e7

/** A closed ring in grid units, first point not repeated at the end, neighbours all different. */
export interface GridRing {
  x: number[]
  y: number[]
}

/** Numbers beyond this are metres of some projection. */
const PROJECTED = 1_000

/** Adding 0 turns −0 into 0. */
const toGrid = (degrees: number): number => Math.round(degrees * GRID_PER_DEGREE) + 0

/**
 * One ring on the 1e-7 degree grid, repeated neighbours dropped; or what is impossible about it: outside the globe, across ±180°,
 * open, too short, without area.
 */
export function toGridRing(ring: readonly (readonly [number, number])[], path: string): GridRing | GeometryFinding[] {
  const outside = findOutside(ring, path)
  if (outside.length > 0) return outside
  const xs = ring.map(([lon]) => toGrid(lon))
  const ys = ring.map(([, lat]) => toGrid(lat))
  const last = ring.length - 1
  const findings: GeometryFinding[] = []
  if (last < 1 || xs[0] !== xs[last] || ys[0] !== ys[last]) findings.push({ code: 'geometry.not_closed', params: {}, path })
  if (ring.length < 4) findings.push({ code: 'geometry.too_few_points', params: { points: ring.length, min: 4 }, path })
  if (findings.length > 0) return findings
  const grid: GridRing = { x: [], y: [] }
  for (let index = 0; index < last; index += 1) {
    const x = xs[index] ?? 0
    const y = ys[index] ?? 0
    if (x === xs[index + 1] && y === ys[index + 1]) continue
    grid.x.push(x)
    grid.y.push(y)
  }
  if (isFlat(grid)) return [{ code: 'geometry.area_zero', params: {}, path }]
  return grid.x.some((x, index) => Math.abs(x - (grid.x[index + 1] ?? grid.x[0] ?? x)) > 180 * GRID_PER_DEGREE)
    ? [{ code: 'geometry.crosses_antimeridian', params: {}, path }]
    : grid
}

/** A grid ring as a closed GeoJSON ring, counter-clockwise or clockwise as asked. */
export function fromGridRing({ x, y }: GridRing, counterClockwise: boolean): Ring {
  const ring: Ring = x.map((value, index) => [value / GRID_PER_DEGREE, (y[index] ?? 0) / GRID_PER_DEGREE])
  const [first] = ring
  if (first) ring.push([first[0], first[1]])
  return signedArea({ x, y }) > 0 === counterClockwise ? ring : ring.reverse()
}

/** The position furthest outside the globe; a ring that runs on past ±180° is told to be split there as well. */
function findOutside(ring: readonly (readonly [number, number])[], path: string): GeometryFinding[] {
  const excess = ring.map(([lon, lat]) => Math.max(Math.abs(lon) - 180, Math.abs(lat) - 90))
  const worst = excess.reduce((best, value, index) => (value > (excess[best] ?? 0) ? index : best), 0)
  if ((excess[worst] ?? 0) <= 0) return []
  const [lon = 0, lat = 0] = ring[worst] ?? []
  const outside: GeometryFinding = { code: nameOutside(ring, lon, lat), params: { lon, lat }, path: `${path}.${worst}` }
  const runsOn = ring.every(([east, north]) => Math.abs(east) <= 360 && Math.abs(north) <= 90)
  return runsOn && ring.some(([east]) => Math.abs(east) < 180)
    ? [outside, { code: 'geometry.crosses_antimeridian', params: {}, path }]
    : [outside]
}

/** What a position outside the globe is: metres, latitude and longitude exchanged all round the ring, or plainly outside. */
function nameOutside(ring: readonly (readonly [number, number])[], lon: number, lat: number): string {
  if (Math.abs(lon) > PROJECTED || Math.abs(lat) > PROJECTED) return 'geometry.degrees_needed'
  const isExchanged = ring.every(([east, north]) => Math.abs(east) <= 90 && Math.abs(north) > 90 && Math.abs(north) <= 180)
  return isExchanged ? 'geometry.maybe_swapped' : 'geometry.out_of_range'
}

function isFlat({ x, y }: GridRing): boolean {
  const [x0 = 0, x1 = 0] = x
  const [y0 = 0, y1 = 0] = y
  return x.every((value, index) => (x1 - x0) * ((y[index] ?? 0) - y0) === (y1 - y0) * (value - x0))
}

/** Twice the area of a ring, grid units squared; above 0 where it runs counter-clockwise. */
export function signedArea({ x, y }: GridRing): number {
  const [x0 = 0] = x
  const [y0 = 0] = y
  let sum = 0
  for (let index = 0; index < x.length; index += 1) {
    const next = (index + 1) % x.length
    sum += ((x[index] ?? 0) - x0) * ((y[next] ?? 0) - y0) - ((x[next] ?? 0) - x0) * ((y[index] ?? 0) - y0)
  }
  return sum
}
