import { describe, expect, it } from 'vitest'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import { ringAbout } from './anyBoundary.ts'
import { buildMultiPolygon, buildPolygon, buildSquare } from './buildRing.ts'

const square = (lon: number, lat = 45, side = 0.001): Boundary => buildPolygon(buildSquare(lon, lat, side))
const sumM2 = (...boundaries: Boundary[]): number => boundaries.reduce((sum, each) => sum + measurePolygon(each).areaM2, 0)
const areaOf = ({ geometry }: { geometry: Boundary | null }): number => (geometry === null ? 0 : sumM2(geometry))
const countOf = (geometry: Boundary | null): number[] => (geometry?.type === 'Polygon' ? geometry.coordinates.map((ring) => ring.length - 1) : [])

describe('uniteBoundaries', () => {
  it('makes one rectangle of two squares side by side, without the corners between them', () => {
    const united = uniteBoundaries([square(10), square(10.001)])
    expect(united).toMatchObject({ findings: [], isApart: false })
    expect(countOf(united.geometry)).toEqual([4])
    expect(areaOf(united) / sumM2(square(10), square(10.001))).toBeCloseTo(1, 6)
  })

  it('keeps a corner of the outline where both meet in an angle', () => {
    const united = uniteBoundaries([square(10), square(10.001, 45, 0.002)])
    expect(countOf(united.geometry)).toEqual([6])
  })

  it('joins edges a hand drew a centimetre or two apart, and one with a corner more', () => {
    const gap = 2e-7
    const other = buildPolygon([[10.001 + gap, 45], [10.002, 45], [10.002, 45.001], [10.001 + gap, 45.001], [10.001 + gap, 45.0006], [10.001 + gap, 45]])
    const united = uniteBoundaries([square(10), other])
    expect(united).toMatchObject({ findings: [], isApart: false })
    expect(united.geometry?.type).toBe('Polygon')
    expect(countOf(united.geometry)).toHaveLength(1)
  })

  it('takes what overlaps once', () => {
    const united = uniteBoundaries([square(10), square(10.0005)])
    expect(areaOf(united) / sumM2(square(10))).toBeCloseTo(1.5, 4)
  })

  it('fills a hole with what lies in it, and leaves a pond', () => {
    const pond = buildSquare(10.0002, 45.0002, 0.0004)
    const around = buildPolygon(buildSquare(10, 45), pond.toReversed())
    expect(countOf(uniteBoundaries([around, buildPolygon(pond)]).geometry)).toEqual([4])
    expect(countOf(uniteBoundaries([around, square(10.001)]).geometry)).toHaveLength(2)
  })

  it('says what lies apart, also where only corners touch', () => {
    expect(uniteBoundaries([square(10), square(10.0011)])).toMatchObject({ isApart: true, geometry: { type: 'MultiPolygon' } })
    expect(uniteBoundaries([square(10), square(10.001, 45.001)])).toMatchObject({ isApart: true })
    expect(uniteBoundaries([square(10), square(10.001), square(10.01)]).isApart).toBe(true)
  })

  it('does not call apart what one of them held in two parts already', () => {
    const two = buildMultiPolygon([buildSquare(10, 45)], [buildSquare(10.01, 45)])
    expect(uniteBoundaries([two, square(10.001)])).toMatchObject({ isApart: false, geometry: { type: 'MultiPolygon' } })
  })

  it('joins three about one corner', () => {
    const united = uniteBoundaries([square(10), square(10.001), square(10, 45.001)])
    expect(united.isApart).toBe(false)
    expect(countOf(united.geometry)).toEqual([6])
  })

  it('does not begin on outlines too finely laced', () => {
    const comb = (lon: number): Boundary => buildPolygon(ringAbout([lon, 45], 100, Array.from({ length: 1_000 }, (_, index) => (index % 2 === 0 ? 0.2 : 1))))
    expect(uniteBoundaries([comb(10), comb(10.0001)])).toEqual({ geometry: null, findings: [{ code: 'geometry.too_fine', params: {} }], isApart: false })
  })
})
