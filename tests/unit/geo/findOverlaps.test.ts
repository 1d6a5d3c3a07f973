import { describe, expect, it } from 'vitest'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import { findOverlaps } from '../../../shared/geo/findOverlaps.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { isFarFrom } from '../../../shared/geo/isFarFrom.ts'
import { looksSwapped } from '../../../shared/geo/looksSwapped.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { buildMultiPolygon, buildPolygon, buildSquare } from './buildRing.ts'

const block = buildPolygon(buildSquare(10, 45, 0.002))
const named = (id: string, lon: number, lat: number, side: number) => ({ id, code: id.toUpperCase(), geometry: buildPolygon(buildSquare(lon, lat, side)) })
const sharedM2 = (a: Boundary, b: Boundary) => findOverlaps(a, [{ id: 'b', code: 'B', geometry: b }]).overlaps[0]?.areaM2 ?? 0

describe('findOverlaps', () => {
  it('gives shared ground and its share of the smaller one, largest first', () => {
    const { overlaps, tooFine } = findOverlaps(block, [
      named('far', 11, 45, 0.002), named('beside', 10.002, 45, 0.002), named('corner', 10.0015, 45.0015, 0.002), named('inside', 10.0002, 45.0002, 0.001),
    ])
    expect(overlaps.map(({ id, code }) => [id, code])).toEqual([['inside', 'INSIDE'], ['corner', 'CORNER']])
    expect(tooFine).toEqual([])
    expect(overlaps[0]?.share).toBeCloseTo(1, 9)
    expect(overlaps[1]?.share).toBeCloseTo(1 / 16, 3)
  })

  it('measures the same ground either way round', () => {
    const other = buildMultiPolygon([buildSquare(10.001, 45.001, 0.002)], [buildSquare(9.9995, 44.9995, 0.001)])
    expect(sharedM2(block, other)).toBeCloseTo(sharedM2(other, block), 6)
    const expected = measurePolygon(buildMultiPolygon([buildSquare(10.001, 45.001)], [buildSquare(10, 45, 0.0005)])).areaM2
    expect(sharedM2(block, other)).toBeCloseTo(expected, 3)
  })

  it('leaves the hole of a block to others', () => {
    const withPond = buildPolygon(buildSquare(10, 45, 0.002), buildSquare(10.0005, 45.0005, 0.001))
    expect(sharedM2(withPond, buildPolygon(buildSquare(10.0006, 45.0006, 0.0005)))).toBe(0)
  })
})

describe('far from the farm', () => {
  it('measures between middles: one degree along the equator is 111.2 km', () => {
    expect(distanceKm([0, 0], [1, 0])).toBeCloseTo(111.195, 3)
    expect(distanceKm(buildPolygon(buildSquare(10, 45)), buildPolygon(buildSquare(10, 45)))).toBe(0)
  })

  it('asks beyond 100 km', () => {
    expect(isFarFrom(block, [10.5, 45])).toBe(false)
    expect(isFarFrom(block, [12, 45])).toBe(true)
    expect(isFarFrom(block, [10.5, 45], 30)).toBe(true)
  })

  it('knows exchanged axes by where they would lead', () => {
    const swapped = buildPolygon(buildSquare(20, -155.5).map(([lon, lat]) => [lon, Math.max(lat, -89)]))
    expect(looksSwapped(buildPolygon(buildSquare(45, 10)), [10, 45])).toBe(true)
    expect(looksSwapped(block, [10, 45])).toBe(false)
    expect(looksSwapped(buildPolygon(buildSquare(45, 30)), [10, 45])).toBe(false)
    expect(looksSwapped(swapped, [-155.5, 20])).toBe(false)
    expect(looksSwapped(buildPolygon(buildSquare(120, 10)), [10, 45])).toBe(false)
  })
})
