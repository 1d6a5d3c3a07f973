import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { findOverlaps } from '../../../shared/geo/findOverlaps.ts'
import { findSplitFaults } from '../../../shared/geo/findSplitFaults.ts'
import { splitBoundary } from '../../../shared/geo/splitBoundary.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import { anyBoundary, anyLine, anyRectangle, lineAcross, RUNS } from './anyBoundary.ts'
import { buildMultiPolygon, buildPolygon, buildSquare } from './buildRing.ts'

const square = buildPolygon(buildSquare(10, 45))
const areaM2 = (geometry: Boundary): number => measurePolygon(geometry).areaM2
const sumM2 = (pieces: readonly Boundary[]): number => pieces.reduce((sum, piece) => sum + areaM2(piece), 0)
const ppm = (value: number, expected: number): number => Math.abs(value / expected - 1) * 1e6
const codes = (geometry: Boundary, line: Position[]): string[] => splitBoundary(geometry, line).findings.map(({ code }) => code)

describe('splitBoundary cuts', () => {
  it('a square into halves, from west to east', () => {
    const { pieces, findings } = splitBoundary(square, [[10.0005, 44.999], [10.0005, 45.002]])
    expect(findings).toEqual([])
    expect(pieces.map(({ coordinates }) => coordinates.flat().length)).toEqual([5, 5])
    const [west, east] = pieces.map((piece) => areaM2(piece) / areaM2(square))
    // What the new corners add and take makes up for itself where they are.
    expect(west).toBeCloseTo(0.5, 5)
    expect(ppm((west ?? 0) + (east ?? 0), 1)).toBeLessThan(1)
  })

  it('from corner to corner without a new corner', () => {
    const { pieces } = splitBoundary(square, [[10, 45], [10.001, 45.001]])
    expect(pieces.map((piece) => piece.coordinates.flat())).toEqual([expect.objectContaining({ length: 4 }), expect.objectContaining({ length: 4 })])
  })

  it('a horseshoe in one stroke into three', () => {
    const horseshoe = buildPolygon([[10, 45], [10.003, 45], [10.003, 45.003], [10.002, 45.003], [10.002, 45.001], [10.001, 45.001], [10.001, 45.003], [10, 45.003], [10, 45]])
    expect(splitBoundary(horseshoe, [[9.999, 45.002], [10.004, 45.002]]).pieces).toHaveLength(3)
  })

  it('through a pond: two pieces, and the pond in neither', () => {
    const ground = buildPolygon(buildSquare(10, 45, 0.003), buildSquare(10.001, 45.001).toReversed())
    const { pieces } = splitBoundary(ground, [[10.0015, 44.999], [10.0015, 45.004]])
    expect(pieces.map(({ coordinates }) => coordinates.length)).toEqual([1, 1])
    expect(ppm(sumM2(pieces), areaM2(ground))).toBeLessThan(1)
  })

  it('beside a pond: it stays with its piece', () => {
    const ground = buildPolygon(buildSquare(10, 45, 0.003), buildSquare(10.0001, 45.001).toReversed())
    expect(splitBoundary(ground, [[10.002, 44.999], [10.002, 45.004]]).pieces.map(({ coordinates }) => coordinates.length)).toEqual([2, 1])
  })

  it('past the corner of a pond: it stays whole, touching the cut', () => {
    const ground = buildPolygon(buildSquare(10, 45, 0.003), buildSquare(10.001, 45.001).toReversed())
    const { pieces } = splitBoundary(ground, [[9.999, 45.003], [10.003, 44.999]])
    expect(pieces.map(({ coordinates }) => coordinates.length)).toEqual([1, 2])
    expect(ppm(sumM2(pieces), areaM2(ground))).toBeLessThan(1)
  })

  it('one part of two, leaving the other whole', () => {
    const two = buildMultiPolygon([buildSquare(10, 45)], [buildSquare(10.002, 45)])
    const { pieces } = splitBoundary(two, [[10.0005, 44.999], [10.0005, 45.002]])
    expect(pieces).toHaveLength(3)
    expect(pieces[2]).toEqual(buildPolygon(buildSquare(10.002, 45)))
  })

  it('around a corner by a bent line', () => {
    expect(splitBoundary(square, [[10.0004, 44.999], [10.0004, 45.0004], [9.999, 45.0004]]).pieces).toHaveLength(2)
  })
})

describe('splitBoundary where the grid has few points near an edge', () => {
  // Rectangles all but along the grid, whose edges have no grid point on them: the corners that make up have to be looked for.
  it.each<{ name: string; ring: Position[]; line: Position[] }>([
    { name: '345 m by 69 m at 52° south', ring: [[134.3636608, -51.7541623], [134.368661, -51.7541604], [134.3686591, -51.7535357], [134.3636589, -51.7535376], [134.3636608, -51.7541623]],
      line: [[134.3600311795435, -51.75384995], [134.36534360393915, -51.7543571965859], [134.3722906204565, -51.75384995]] },
    { name: '140 m by 20 m at 44° south', ring: [[148.0924199, -43.526249], [148.0941508, -43.5262482], [148.09415, -43.5260652], [148.0924191, -43.526066], [148.0924199, -43.526249]],
      line: [[148.09147680506388, -43.5261575], [148.09304421067517, -43.52633295995388], [148.09509389493613, -43.5261575]] },
    { name: '647 m by 17 m at 15° north', ring: [[51.2550945, 14.6090307], [51.2610942, 14.6090324], [51.2610925, 14.6091834], [51.2550928, 14.6091817], [51.2550945, 14.6090307]],
      line: [[51.253430057935276, 14.60874486133642], [51.25809435, 14.6091062], [51.262758642064725, 14.609467538663578]] },
  ])('$name', ({ ring, line }) => {
    const { pieces, findings } = splitBoundary(buildPolygon(ring), line)
    expect(findings).toEqual([])
    expect(ppm(sumM2(pieces), areaM2(buildPolygon(ring)))).toBeLessThan(1)
  })
})

describe('splitBoundary says', () => {
  it.each<{ what: string; line: Position[]; code: string }>([
    { what: 'one point', line: [[10, 45]], code: 'split.too_short' },
    { what: 'one point twice', line: [[9, 45], [9, 45]], code: 'split.too_short' },
    { what: 'a line beside it', line: [[9.999, 44], [9.999, 46]], code: 'split.misses' },
    { what: 'a line along its edge', line: [[10, 44.999], [10, 45.002]], code: 'split.misses' },
    { what: 'a line that touches a corner', line: [[9.999, 45.001], [10.001, 44.999]], code: 'split.misses' },
    { what: 'a line that ends inside', line: [[10.0005, 44.999], [10.0005, 45.0005]], code: 'split.ends_inside' },
    { what: 'a line that crosses itself', line: [[9.999, 45.0005], [10.002, 45.0005], [10.0005, 45.002], [10.0005, 44.999]], code: 'split.crosses_itself' },
    { what: 'a piece under 1 m²', line: [[10.000009, 44.999], [10.000009, 45.000007], [9.999, 45.000007]], code: 'split.not_possible' },
  ])('$what', ({ line, code }) => {
    expect(codes(square, line)).toEqual([code])
  })

  it('a line from the outline into a pond that goes no further', () => {
    const ground = buildPolygon(buildSquare(10, 45, 0.003), buildSquare(10.001, 45.001).toReversed())
    expect(codes(ground, [[10.0015, 44.999], [10.0015, 45.0015]])).toEqual(['split.misses'])
  })
})

describe('splitBoundary on any outline', () => {
  it.each([{ name: 'bent', any: anyBoundary }, { name: 'along the grid', any: anyRectangle }])(
    '$name: pieces sum to the whole within 1 ppm, share no ground, and unite to what was split', ({ any }) => {
      const refused: string[] = []
      let unlike = 0
      fc.assert(fc.property(any, anyLine, (made, line) => {
        const { pieces, findings } = splitBoundary(made.geometry, lineAcross(made, line))
        refused.push(...findings.map(({ code }) => code).filter((code) => code !== 'split.misses'))
        if (findings.length > 0) return
        expect(pieces.length).toBeGreaterThan(1)
        expect(ppm(sumM2(pieces), areaM2(made.geometry))).toBeLessThan(1)
        expect(findSplitFaults(made.geometry, pieces)).toEqual([])
        pieces.forEach((piece, index) => {
          expect(checkBoundary(piece)).toEqual({ geometry: piece, findings: [] })
          expect(findOverlaps(piece, pieces.slice(0, index).map((geometry) => ({ id: '', code: '', geometry }))).overlaps).toEqual([])
        })
        const united = uniteBoundaries(pieces)
        expect(united.isApart).toBe(false)
        expect(ppm(areaM2(united.geometry ?? made.geometry), areaM2(made.geometry))).toBeLessThan(1)
        if (`${cornersOf(united.geometry)}` !== `${cornersOf(made.geometry)}`) unlike += 1
      }), RUNS)
      // Pieces too small to stand, or edges too short to make up on; corners of the outline itself on a line with their neighbours.
      expect(refused.length).toBeLessThan(RUNS.numRuns / 300)
      expect(unlike).toBeLessThan(RUNS.numRuns / 100)
    },
  )
})

/** Corners without regard to where a ring starts. */
function cornersOf(geometry: Boundary | null): string[] {
  const rings = geometry === null ? [] : geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates.flat()
  return rings.flatMap((ring) => ring.slice(1).map((corner) => corner.join(' '))).sort()
}
