import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { boundarySchema } from '../../../shared/contract/block.ts'
import { checkBoundary } from '../../../shared/geo/checkBoundary.ts'
import type { Position, Ring } from '../../../shared/geo/geometryTypes.ts'
import { REFERENCE_POLYGONS } from '../../reference/geo/referencePolygons.ts'
import { buildMultiPolygon, buildPolygon, buildSquare, startAt } from './buildRing.ts'

const square = buildSquare(10, 45)
const bowTie: Ring = [[10, 45], [10.002, 45.002], [10.002, 45], [10, 45.002], [10, 45]]
const circle = (count: number, reach = 0.01): Ring => {
  const ring = Array.from({ length: count }, (_, index): Position => {
    const angle = (2 * Math.PI * index) / count
    return [10 + reach * Math.cos(angle), 45 + reach * Math.sin(angle)]
  })
  return [...ring, ...ring.slice(0, 1)]
}
const codes = (geometry: unknown): string[] => checkBoundary(geometry).findings.map(({ code }) => code)

describe('checkBoundary lets stand', () => {
  // R18 runs on past 180°: RFC 7946 wants it cut there.
  it.each(REFERENCE_POLYGONS.filter(({ id }) => id !== 'R18'))('$id $what', ({ geometry }) => {
    expect(checkBoundary(geometry).findings).toEqual([])
  })

  it('a square as it is', () => {
    expect(checkBoundary(buildPolygon(square))).toEqual({ geometry: buildPolygon(square), findings: [] })
  })

  it('a clockwise ring, turned right-handed, and a hole the other way', () => {
    const hole = buildSquare(10.0002, 45.0002, 0.0002)
    const { geometry } = checkBoundary(buildPolygon(square.toReversed(), hole))
    expect(geometry).toEqual(buildPolygon(square, hole.toReversed()))
  })

  it('heights and repeated neighbours, dropped', () => {
    const typed = square.flatMap(([lon, lat]) => [[lon, lat, 120], [lon, lat, 121, 5]])
    expect(checkBoundary({ type: 'Polygon', coordinates: [typed] }).geometry).toEqual(buildPolygon(square))
    const many = [...Array.from({ length: 4_000 }, () => square[0]), ...square.slice(1)]
    expect(checkBoundary({ type: 'Polygon', coordinates: [many] }).geometry).toEqual(buildPolygon(square))
  })

  it('more than seven decimals, rounded', () => {
    const typed = square.map(([lon, lat]) => [lon + 3e-9, lat - 3e-9])
    expect(checkBoundary({ type: 'Polygon', coordinates: [typed] }).geometry).toEqual(buildPolygon(square))
  })

  it('parts side by side, a hole that touches its ring in a point, an island in a pond', () => {
    const neighbour = buildSquare(10.001, 45)
    expect(codes(buildMultiPolygon([square], [neighbour]))).toEqual([])
    const touching: Ring = [[10, 45.0005], [10.0003, 45.0003], [10.0003, 45.0007], [10, 45.0005]]
    expect(codes(buildPolygon(square, touching))).toEqual([])
    const pond = buildSquare(10.0002, 45.0002, 0.0006)
    expect(codes(buildMultiPolygon([square, pond], [buildSquare(10.0004, 45.0004, 0.0002)]))).toEqual([])
  })

  it('a strip of 3 m by 1 500 m and a narrow wedge', () => {
    expect(codes(buildPolygon([[10, 45], [10.02, 45], [10.02, 45.00003], [10, 45.00003], [10, 45]]))).toEqual([])
    expect(codes(buildPolygon([[10, 45], [10.01, 45], [10.01, 45.00002], [10, 45]]))).toEqual([])
  })
})

describe('checkBoundary refuses', () => {
  const swapAxes = (ring: Ring): Ring => ring.map(([lon, lat]) => [lat, lon])
  const flat: Ring = [[10, 45], [10.001, 45.001], [10.003, 45.003], [10.002, 45.002], [10, 45]]
  const spiked: Ring = [[10, 45], [10.001, 45], [10.001, 45.001], [10.0005, 45.001], [10.0005, 45.002], [10.0005, 45.001], [10, 45.001], [10, 45]]
  const nearlySpiked: Ring = spiked.map(([lon, lat], index) => (index === 5 ? [lon - 1e-7, lat] : [lon, lat]))
  const touchingItself: Ring = [[10, 45], [10.002, 45], [10.002, 45.002], [10.001, 45], [10, 45.002], [10, 45]]

  it.each([
    { what: 'a point', geometry: { type: 'Point', coordinates: [10, 45] }, code: 'geometry.type' },
    { what: 'a collection', geometry: { type: 'GeometryCollection', geometries: [] }, code: 'geometry.type' },
    { what: 'a feature', geometry: { type: 'Feature', geometry: buildPolygon(square) }, code: 'geometry.type' },
    { what: 'null', geometry: null, code: 'geometry.type' },
    { what: 'a text', geometry: 'POLYGON((0 0))', code: 'geometry.type' },
    { what: 'no coordinates', geometry: { type: 'Polygon' }, code: 'geometry.coordinates' },
    { what: 'no rings', geometry: { type: 'Polygon', coordinates: [] }, code: 'geometry.coordinates' },
    { what: 'an empty ring', geometry: { type: 'Polygon', coordinates: [[]] }, code: 'geometry.coordinates' },
    { what: 'no parts', geometry: { type: 'MultiPolygon', coordinates: [[]] }, code: 'geometry.coordinates' },
    { what: 'numbers as text', geometry: { type: 'Polygon', coordinates: [[['10', '45'], ['11', '45'], ['11', '46'], ['10', '45']]] }, code: 'geometry.coordinates' },
    { what: 'an infinity', geometry: buildPolygon([[1 / 0, 45], ...square.slice(1)]), code: 'geometry.coordinates' },
    { what: 'a crs member', geometry: { ...buildPolygon(square), crs: { type: 'name' } }, code: 'geometry.crs' },
    { what: 'a corner beyond the pole', geometry: buildPolygon(buildSquare(10, 89.9995)), code: 'geometry.out_of_range' },
    { what: 'longitude −181', geometry: buildPolygon(buildSquare(-181, 45)), code: 'geometry.out_of_range' },
    { what: 'an open ring', geometry: buildPolygon(square.slice(0, -1)), code: 'geometry.not_closed' },
    { what: 'three positions', geometry: buildPolygon([[10, 45], [10.001, 45], [10, 45]]), code: 'geometry.too_few_points' },
    { what: 'one point five times', geometry: buildPolygon(square.map(() => [10, 45])), code: 'geometry.area_zero' },
    { what: 'points on one line', geometry: buildPolygon(flat), code: 'geometry.area_zero' },
    { what: 'a bow-tie', geometry: buildPolygon(bowTie), code: 'geometry.self_intersection' },
    { what: 'a ring that touches itself', geometry: buildPolygon(touchingItself), code: 'geometry.self_intersection' },
    { what: 'a spike', geometry: buildPolygon(spiked), code: 'geometry.spike' },
    { what: 'a spike a centimetre wide', geometry: buildPolygon(nearlySpiked), code: 'geometry.spike' },
    { what: 'a hole outside', geometry: buildPolygon(square, buildSquare(10.01, 45)), code: 'geometry.hole_outside' },
    { what: 'a hole across the edge', geometry: buildPolygon(square, buildSquare(10.0005, 45.0005)), code: 'geometry.hole_outside' },
    { what: 'a hole around its ring', geometry: buildPolygon(square, buildSquare(9.999, 44.999, 0.01)), code: 'geometry.hole_outside' },
    { what: 'holes on each other', geometry: buildPolygon(buildSquare(10, 45, 0.01), buildSquare(10.001, 45.001), buildSquare(10.0015, 45.0015)), code: 'geometry.holes_overlap' },
    { what: 'the same part twice', geometry: buildMultiPolygon([square], [square]), code: 'geometry.parts_overlap' },
    { what: 'parts across each other', geometry: buildMultiPolygon([square], [buildSquare(10.0005, 45.0005)]), code: 'geometry.parts_overlap' },
    { what: 'a ring across 180°', geometry: buildPolygon([[179.999, -17], [-179.999, -17], [-179.999, -16.999], [179.999, -16.999], [179.999, -17]]), code: 'geometry.crosses_antimeridian' },
    { what: '0.5 m²', geometry: buildPolygon(buildSquare(10, 0, 0.0000063)), code: 'geometry.area_range' },
    { what: '80 000 ha', geometry: buildPolygon(buildSquare(10, 0, 0.255)), code: 'geometry.area_range' },
    { what: '5 001 points', geometry: buildPolygon(circle(5_000)), code: 'geometry.too_many_points' },
  ])('$what', ({ geometry, code }) => {
    expect(checkBoundary(geometry)).toMatchObject({ geometry: null, findings: [{ code }] })
    expect(codes(geometry)).toHaveLength(1)
  })

  it('projected metres, saying that degrees are needed', () => {
    const projected = square.map((_, index) => [1113194 + index, 6446275])
    const [finding] = checkBoundary({ type: 'Polygon', coordinates: [projected] }).findings
    expect(finding).toMatchObject({ code: 'geometry.degrees_needed', params: { lat: 6446275 } })
  })

  it('a ring that runs on past 180°, saying that it must be cut there', () => {
    const [, , r18] = REFERENCE_POLYGONS.slice(15)
    expect(codes(r18?.geometry)).toEqual(['geometry.out_of_range', 'geometry.crosses_antimeridian'])
  })

  it('a crossing, with its point and both edges', () => {
    expect(checkBoundary(buildPolygon(bowTie)).findings).toEqual([
      { code: 'geometry.self_intersection', params: { lon: 10.001, lat: 45.001, edgeA: 1, edgeB: 3 }, path: 'coordinates.0' },
    ])
    expect(checkBoundary(buildMultiPolygon([square], [bowTie])).findings[0]?.path).toBe('coordinates.1.0')
  })

  it('swapped axes only where they leave the globe', () => {
    expect(codes(buildPolygon(swapAxes(buildSquare(-155, 20))))).toEqual(['geometry.maybe_swapped'])
    expect(codes(buildPolygon(buildSquare(-155, 170)))).toEqual(['geometry.out_of_range'])
    expect(codes(buildPolygon(buildSquare(20, 181)))).toEqual(['geometry.out_of_range'])
    expect(codes(buildPolygon(swapAxes(square)))).toEqual([])
  })
})

describe('checkBoundary on any input', () => {
  const RUNS = { seed: 20_260_616, numRuns: 300 }

  it('never throws, and lets stand only what the contract stores', () => {
    const nested = fc.anything({ maxDepth: 5 })
    const junk = fc.oneof(nested, fc.record({ type: fc.constantFrom('Polygon', 'MultiPolygon', 'Point'), coordinates: nested }))
    fc.assert(fc.property(junk, (geometry) => {
      const check = checkBoundary(geometry)
      expect(check.geometry === null).toBe(check.findings.length > 0)
    }), RUNS)
  })

  it('finds the same for any first corner and either direction', () => {
    const place = fc.tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: 0, max: 60 })).map(([x, y]): Position => [(100_000 + x) / 1e4, (450_000 + y) / 1e4])
    fc.assert(fc.property(fc.array(place, { minLength: 3, maxLength: 12 }), fc.nat(11), (corners, corner) => {
      const ring = [...corners, ...corners.slice(0, 1)]
      const strip = (geometry: Ring) => checkBoundary(buildPolygon(geometry)).findings.map(({ code, params }) => ({ code, lon: params['lon'], lat: params['lat'] }))
      expect(strip(ring.toReversed())).toEqual(strip(ring))
      expect(strip(startAt(ring, corner % corners.length))).toEqual(strip(ring))
    }), RUNS)
  })

  it('what stands, stands unchanged the second time', () => {
    for (const { geometry } of REFERENCE_POLYGONS) {
      const once = checkBoundary(geometry).geometry
      if (once === null) continue
      expect(boundarySchema.safeParse(once).success).toBe(true)
      expect(checkBoundary(once)).toEqual({ geometry: once, findings: [] })
    }
  })

  it('takes 5 000 points, and a million only to count them', () => {
    expect(codes(buildPolygon(circle(4_999)))).toEqual([])
    const comb = Array.from({ length: 1_249 }, (_, tooth): Ring => {
      const south = 45 + tooth * 4e-5
      return [[10, south], [10.03, south], [10.03, south + 1e-5], [10, south + 1e-5]]
    }).flat()
    expect(codes(buildPolygon([...comb, [9.999, 45.05], [9.999, 45], [10, 45]]))).toEqual([])
    expect(codes(buildPolygon(circle(1_000_000)))).toEqual(['geometry.too_many_points'])
  })
})
