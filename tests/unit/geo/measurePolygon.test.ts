import fc from 'fast-check'
import geodesic from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import { metresPerDegree } from '../../../shared/geo/ellipsoid.ts'
import type { Position, Ring } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { buildPolygon, buildSquare, startAt } from './buildRing.ts'

const RUNS = { seed: 20_260_616, numRuns: 200 }

/** A ring round a middle: corners at rising angles, each at its own distance, metres. */
const field: fc.Arbitrary<Ring> = fc
  .record({
    lon: fc.double({ min: -179, max: 179, noNaN: true }),
    lat: fc.double({ min: -75, max: 75, noNaN: true }),
    reach: fc.integer({ min: 15, max: 2_500 }),
    corners: fc.array(fc.double({ min: 0.4, max: 1, noNaN: true }), { minLength: 3, maxLength: 40 }),
  })
  .map(({ lon, lat, reach, corners }) => {
    const metres = metresPerDegree(lat)
    const ring = corners.map((share, index): Position => {
      const angle = (2 * Math.PI * index) / corners.length
      return [lon + (share * reach * Math.cos(angle)) / metres.east, lat + (share * reach * Math.sin(angle)) / metres.north]
    })
    return [...ring, ...ring.slice(0, 1)]
  })

function oracle(ring: Ring): { areaM2: number; perimeterM: number } {
  const polygon = geodesic.Geodesic.WGS84.Polygon(false)
  for (const [lon, lat] of ring.slice(0, -1)) polygon.AddPoint(lat, lon)
  const { area = 0, perimeter } = polygon.Compute(false, true)
  return { areaM2: Math.abs(area), perimeterM: perimeter }
}

const relative = (value: number, expected: number): number => Math.abs(value / expected - 1)

describe('measurePolygon against geographiclib-geodesic', () => {
  it('agrees on random fields of 3 to 40 corners, from beds to 2 000 ha', () => {
    fc.assert(fc.property(field, (ring) => {
      const measure = measurePolygon(buildPolygon(ring))
      const expected = oracle(ring)
      expect(relative(measure.areaM2, expected.areaM2)).toBeLessThan(2e-5)
      expect(relative(measure.perimeterM, expected.perimeterM)).toBeLessThan(1e-7)
    }), RUNS)
  })

  it('does not depend on direction, first corner or longitude', () => {
    fc.assert(fc.property(field, fc.nat(39), fc.integer({ min: -180, max: 180 }), (ring, corner, east) => {
      const expected = measurePolygon(buildPolygon(ring))
      const moved = ring.map(([lon, lat]): Position => [lon + east, lat])
      for (const other of [ring.toReversed(), startAt(ring, corner % (ring.length - 1)), moved]) {
        const measure = measurePolygon(buildPolygon(other))
        expect(relative(measure.areaM2, expected.areaM2)).toBeLessThan(1e-6)
        expect(relative(measure.perimeterM, expected.perimeterM)).toBeLessThan(1e-7)
      }
    }), RUNS)
  })

  it('takes holes off the area and adds their rings to the perimeter', () => {
    const outer = buildSquare(10, 45, 0.004)
    const hole = buildSquare(10.001, 45.001, 0.001)
    const [whole, inner, both] = [measurePolygon(buildPolygon(outer)), measurePolygon(buildPolygon(hole)), measurePolygon(buildPolygon(outer, hole))]
    expect(both.areaM2).toBeCloseTo(whole.areaM2 - inner.areaM2, 6)
    expect(both.perimeterM).toBeCloseTo(whole.perimeterM + inner.perimeterM, 9)
  })

  it.each([
    { what: 'an open ring', ring: buildSquare(10, 45).slice(0, -1) },
    { what: 'two points', ring: [[10, 45], [10, 45]] satisfies Ring },
    { what: 'a pole and more', ring: buildSquare(10, 90) },
    { what: 'no number', ring: buildSquare(Number.NaN, 45) },
    { what: 'nothing', ring: [] },
  ])('refuses $what', ({ ring }) => {
    expect(() => measurePolygon(buildPolygon(ring))).toThrow(RangeError)
  })

  it('is not disturbed by repeated corners', () => {
    const ring = buildSquare(10, 45)
    const repeated = ring.flatMap((place) => [place, place])
    expect(measurePolygon(buildPolygon(repeated)).areaM2).toBeCloseTo(measurePolygon(buildPolygon(ring)).areaM2, 6)
  })
})
