import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findOverlaps } from '../../../shared/geo/findOverlaps.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { movePosition } from '../../../shared/geo/movePosition.ts'
import { snapToNeighbours } from '../../../shared/geo/snapToNeighbours.ts'
import { splitBoundary } from '../../../shared/geo/splitBoundary.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import { anyBoundary, anyLine, lineAcross, RUNS } from './anyBoundary.ts'
import { buildPolygon, buildSquare } from './buildRing.ts'

const square = buildPolygon(buildSquare(10, 45))
/** 0.4 m east at 45° north. */
const GAP = 0.000005
const cornersOf = (geometry: Boundary | null): string[] => (geometry?.type === 'Polygon' ? geometry.coordinates.flat().map((corner) => corner.join(' ')) : [])

describe('snapToNeighbours', () => {
  it.each([{ side: 'a gap', shift: GAP }, { side: 'an overlap', shift: -GAP }])('closes $side: the common edge has the same corners', ({ shift }) => {
    const { geometry, changed } = snapToNeighbours(buildPolygon(buildSquare(10.001 + shift, 45)), [square], 1)
    expect(cornersOf(geometry)).toEqual(expect.arrayContaining(['10.001 45', '10.001 45.001']))
    expect(changed).toBe(2)
    expect(uniteBoundaries([square, geometry ?? square])).toMatchObject({ isApart: false, geometry: { type: 'Polygon' } })
  })

  it('sets a neighbour\'s corner into an edge that runs past it', () => {
    const long = buildPolygon([[10.001 + GAP, 44.999], [10.002, 44.999], [10.002, 45.002], [10.001 + GAP, 45.002], [10.001 + GAP, 44.999]])
    const { geometry } = snapToNeighbours(long, [square], 1)
    expect(cornersOf(geometry)).toEqual(expect.arrayContaining(['10.001 45', '10.001 45.001']))
  })

  it('puts a corner onto an edge, and drops those between', () => {
    const toothed = buildPolygon([[10.001 + GAP, 45], [10.002, 45], [10.002, 45.001], [10.001 + GAP, 45.001], [10.001 + GAP / 2, 45.0006], [10.001 - GAP, 45.0003], [10.001 + GAP, 45]])
    expect(cornersOf(snapToNeighbours(toothed, [square], 1).geometry)).toHaveLength(5)
  })

  it('leaves what lies farther off as it is', () => {
    const other = buildPolygon(buildSquare(10.0012, 45))
    expect(snapToNeighbours(other, [square], 1)).toEqual({ geometry: other, findings: [], changed: 0 })
    expect(snapToNeighbours(square, [], 1)).toEqual({ geometry: square, findings: [], changed: 0 })
  })

  it('says why, where the snapped outline could not stand', () => {
    const sliver = buildPolygon([[10, 45.001], [10.001, 45.001], [10.001, 45.00101], [10, 45.00101], [10, 45.001]])
    expect(snapToNeighbours(sliver, [square], 3).geometry).toBeNull()
    expect(snapToNeighbours(sliver, [square], 3).findings).not.toEqual([])
  })

  it('leaves no sliver along any border, whichever way the hand shook', () => {
    // Shapes whose own features are far wider than the reach: a corner narrower than that is closed with the gap.
    const field = anyBoundary.filter(({ reachM, geometry }) => reachM > 100 && geometry.coordinates.length === 1)
    const shaken = fc.record({ made: field, line: anyLine, shifts: fc.array(fc.tuple(fc.double({ min: -0.6, max: 0.6, noNaN: true }), fc.double({ min: -0.6, max: 0.6, noNaN: true })), { minLength: 40, maxLength: 40 }) })
    fc.assert(fc.property(shaken, ({ made, line, shifts }) => {
      const [west, east] = splitBoundary(made.geometry, lineAcross(made, line)).pieces
      fc.pre(west !== undefined && east !== undefined && Math.min(measurePolygon(west).areaM2, measurePolygon(east).areaM2) > 200)
      if (west === undefined || east === undefined) return
      const drawn = shake(east, shifts)
      const snapped = snapToNeighbours(drawn, [west], 1).geometry
      fc.pre(snapped !== null)
      if (snapped === null) return
      const { overlaps } = findOverlaps(snapped, [{ id: 'w', code: 'W', geometry: west }])
      expect(overlaps.reduce((sum, { areaM2 }) => sum + areaM2, 0)).toBeLessThan(1)
      expect(uniteBoundaries([west, snapped]).isApart).toBe(false)
    }), { ...RUNS, numRuns: 150 })
  })
})

function shake(geometry: Boundary, shifts: readonly (readonly [number, number])[]): Boundary {
  const ring = (geometry.type === 'Polygon' ? geometry.coordinates[0] : geometry.coordinates[0]?.[0]) ?? []
  const corners = ring.slice(0, -1).map((corner, index): Position => movePosition(corner, ...(shifts[index % shifts.length] ?? [0, 0])))
  return buildPolygon([...corners, ...corners.slice(0, 1)])
}
