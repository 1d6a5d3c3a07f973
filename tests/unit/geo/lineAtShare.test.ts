import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { lineAtShare } from '../../../shared/geo/lineAtShare.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { splitBoundary } from '../../../shared/geo/splitBoundary.ts'
import { anyBoundary, RUNS } from './anyBoundary.ts'
import { buildPolygon, buildSquare } from './buildRing.ts'

const square = buildPolygon(buildSquare(10, 45))
const south = { part: 0, ring: 0, corner: 0 }
const areaM2 = (geometry: Boundary): number => measurePolygon(geometry).areaM2

describe('lineAtShare', () => {
  it('lies a quarter of the way up a square for a quarter of its area', () => {
    const [from, to] = lineAtShare(square, south, 0.25)
    expect([from[1], to[1]].map((lat) => (lat - 45) * 1_000)).toEqual([expect.closeTo(0.25, 4), expect.closeTo(0.25, 4)])
    expect(from[0]).toBeLessThan(10)
    expect(to[0]).toBeGreaterThan(10.001)
  })

  it.each([0.1, 0.25, 0.5, 0.9])('a square cut there has %s of its area on the edge\'s side', (share) => {
    for (const corner of [0, 1, 2, 3]) {
      const line = lineAtShare(square, { ...south, corner }, share)
      const near = splitBoundary(square, line).pieces.find((piece) => isBelow(piece, line))
      expect((near ? areaM2(near) : 0) / areaM2(square)).toBeCloseTo(share, 4)
    }
  })

  it.each([0, 1, -0.5, Number.NaN])('refuses a share of %s', (share) => {
    expect(() => lineAtShare(square, south, share)).toThrow(RangeError)
    expect(() => lineAtShare(square, { ...south, corner: 9 }, 0.5)).toThrow(RangeError)
  })

  it('cuts off what was asked, on the edge\'s side, of any outline', () => {
    fc.assert(fc.property(anyBoundary, fc.double({ min: 0.1, max: 0.9, noNaN: true }), ({ geometry }, share) => {
      const line = lineAtShare(geometry, south, share)
      const { pieces } = splitBoundary(geometry, line)
      fc.pre(pieces.length > 0)
      const near = pieces.filter((piece) => isBelow(piece, line)).reduce((sum, piece) => sum + areaM2(piece), 0)
      // The corners of the cut are set to the grid, up to a decimetre along an edge.
      expect(Math.abs(near / areaM2(geometry) - share)).toBeLessThan(0.02)
    }), { ...RUNS, numRuns: 100 })
  })
})

/** Whether a piece lies right of the line: its corner farthest from it does. */
function isBelow(piece: Boundary, [from, to]: [Position, Position]): boolean {
  const sides = ((piece.type === 'Polygon' ? piece.coordinates[0] : []) ?? []).map(([lon, lat]) => (to[0] - from[0]) * (lat - from[1]) - (to[1] - from[1]) * (lon - from[0]))
  const [least, most] = [Math.min(...sides), Math.max(...sides)]
  return -least > most
}
