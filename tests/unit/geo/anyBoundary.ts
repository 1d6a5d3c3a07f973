import fc from 'fast-check'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import type { Boundary, Position, Ring } from '../../../shared/geo/geometryTypes.ts'
import { movePosition } from '../../../shared/geo/movePosition.ts'

/** Runs are the same every time; a failure names its own shape. */
export const RUNS = { seed: 20_261_201, numRuns: 300 }

export interface AnyBoundary { middle: Position; reachM: number; geometry: Boundary }

/** A ring about a middle, its corners at these shares of the reach. */
export function ringAbout(middle: Position, reachM: number, shares: readonly number[], turn = 0): Ring {
  const corners = shares.map((share, index): Position => {
    const angle = turn + (2 * Math.PI * index) / shares.length
    return movePosition(middle, reachM * share * Math.cos(angle), reachM * share * Math.sin(angle))
  })
  return [...corners, ...corners.slice(0, 1)]
}

/** Outlines of 0.03 to 40 ha between 66° south and north, bent in and out, half of them with a pond. */
export const anyBoundary: fc.Arbitrary<AnyBoundary> = fc
  .record({
    lon: fc.double({ min: -170, max: 170, noNaN: true }),
    lat: fc.double({ min: -66, max: 66, noNaN: true }),
    reachM: fc.double({ min: 16, max: 450, noNaN: true }),
    shares: fc.array(fc.double({ min: 0.45, max: 1, noNaN: true }), { minLength: 5, maxLength: 16 }),
    turn: fc.double({ min: 0, max: 6, noNaN: true }),
    pond: fc.boolean(),
  })
  .map(({ lon, lat, reachM, shares, turn, pond }) => {
    const middle: Position = [lon, lat]
    const rings = [ringAbout(middle, reachM, shares, turn), ...(pond ? [ringAbout(middle, reachM * 0.2, [1, 0.7, 1, 0.8, 0.9], turn)] : [])]
    const { geometry } = checkBoundary({ type: 'Polygon', coordinates: rings })
    return geometry === null ? null : { middle, reachM, geometry }
  })
  .filter((made) => made !== null)

/** Rectangles whose edges lie along the grid or all but along it: there the grid has fewest points near an edge. */
export const anyRectangle: fc.Arbitrary<AnyBoundary> = fc
  .record({
    lon: fc.integer({ min: -1_700_000_000, max: 1_700_000_000 }), lat: fc.integer({ min: -660_000_000, max: 660_000_000 }),
    wide: fc.integer({ min: 1_500, max: 60_000 }), high: fc.integer({ min: 1_500, max: 60_000 }), skew: fc.integer({ min: -30, max: 30 }),
  })
  .map(({ lon, lat, wide, high, skew }) => {
    const at = (x: number, y: number): Position => [(lon + x) / 1e7, (lat + y) / 1e7]
    const ring = [at(0, 0), at(wide, skew), at(wide - skew, high + skew), at(-skew, high), at(0, 0)]
    return { middle: at(wide / 2, high / 2), reachM: Math.hypot(wide, high) * 0.0056, geometry: { type: 'Polygon', coordinates: [ring] } }
  })

/** A line across a boundary: through a place near its middle, in any direction, ending outside. */
export const anyLine = fc.record({
  off: fc.double({ min: -0.35, max: 0.35, noNaN: true }),
  angle: fc.double({ min: 0, max: Math.PI, noNaN: true }),
  bend: fc.double({ min: -0.2, max: 0.2, noNaN: true }),
})

/** The three points of such a line. */
export function lineAcross({ middle, reachM }: AnyBoundary, { off, angle, bend }: { off: number; angle: number; bend: number }): Position[] {
  const at = (along: number, aside: number): Position =>
    movePosition(middle, reachM * (along * Math.cos(angle) - aside * Math.sin(angle)), reachM * (along * Math.sin(angle) + aside * Math.cos(angle)))
  return [at(-1.5, off), at(bend, off + bend), at(1.5, off)]
}
