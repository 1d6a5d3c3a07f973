import { describe, expect, it } from 'vitest'
import { AUTHALIC_RADIUS_M, metresPerDegree } from '../../../shared/geo/ellipsoid.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { REFERENCE_POLYGONS } from './referencePolygons.ts'

const HUNDREDTH_OF_A_PERCENT = 1e-4
const relative = (value: number, expected: number): number => Math.abs(value / expected - 1)

describe('area and perimeter, GeographicLib Planimeter 2.1.2', () => {
  it('has all twenty polygons', () => {
    expect(REFERENCE_POLYGONS.map(({ id }) => id)).toEqual(Array.from({ length: 20 }, (_, index) => `R${String(index + 1).padStart(2, '0')}`))
  })

  it.each(REFERENCE_POLYGONS)('$id $what', ({ geometry, areaM2, perimeterM }) => {
    const measure = measurePolygon(geometry)
    expect(relative(measure.areaM2, areaM2)).toBeLessThan(HUNDREDTH_OF_A_PERCENT)
    expect(relative(measure.areaM2, areaM2)).toBeLessThan(20e-6)
    expect(relative(measure.areaM2, areaM2)).toBeLessThan(0.3e-6)
    expect(relative(measure.perimeterM, perimeterM)).toBeLessThan(HUNDREDTH_OF_A_PERCENT)
    expect(Math.abs(measure.perimeterM - perimeterM)).toBeLessThan(1e-5)
  })

  it.each(REFERENCE_POLYGONS)('$id with one corner moved by 1 % of its extent is another area', ({ geometry, areaM2 }) => {
    expect(relative(measurePolygon(moveFirstCorner(geometry)).areaM2, areaM2)).toBeGreaterThan(HUNDREDTH_OF_A_PERCENT)
  })
})

describe('figures documented by GeographicLib', () => {
  it.each([
    // The sides are over 100 km: the great circle's path is tried far beyond any field.
    { id: 'W3.3', corners: [[0, -1], [-1, 0], [0, 1], [1, 0]], areaM2: 24619419146, perimeterM: 627598.2731, source: 'geodesictest.js Planimeter0' },
    { id: 'W3.4', corners: [[2, 1], [1, 2], [3, 3]], areaM2: 18454562325.45119, perimeterM: null, source: 'geodesictest.js Planimeter15' },
    { id: 'W3.6', corners: [[90, 0], [0, 0], [0, 90]], areaM2: 63758202715511, perimeterM: 30022685, source: 'geodesictest.js Planimeter0' },
  ])('$id ($source)', ({ corners, areaM2, perimeterM }) => {
    const measure = measurePolygon(fromLatLon(corners))
    expect(relative(measure.areaM2, areaM2)).toBeLessThan(2e-6)
    expect(perimeterM === null ? 0 : relative(measure.perimeterM, perimeterM)).toBeLessThan(20e-6)
  })

  it('W3.2 perimeter round the pole (geodesictest.js Planimeter0)', () => {
    const { perimeterM } = measurePolygon(fromLatLon([[89, 0], [89, 90], [89, 180], [89, 270]]))
    expect(relative(perimeterM, 631819.8745)).toBeLessThan(1e-6)
  })

  it('W3.5 the ellipsoid in all (same file)', () => {
    expect(4 * Math.PI * AUTHALIC_RADIUS_M ** 2).toBeCloseTo(510065621724088.5, -1)
    expect(AUTHALIC_RADIUS_M).toBeCloseTo(6371007.180918, 6)
  })
})

describe('bias of a mean sphere against the ellipsoid (COMPUTED)', () => {
  it.each([
    [0, 0.44905], [10, 0.4085], [15, 0.35898], [20, 0.29179], [25, 0.20899], [30, 0.11311], [35.3211, 0], [40, -0.10586], [45, -0.22227],
    [50, -0.33861], [55, -0.45136], [60, -0.55708], [65, -0.6526], [70, -0.73501], [75, -0.80183], [80, -0.85105], [85, -0.88119],
  ])('at %d° is %d %', (lat, percent) => {
    const { north, east } = metresPerDegree(lat)
    const areaOfDegree = (north * east) / Math.cos((lat * Math.PI) / 180)
    const onSphere = (6371008.8 * Math.PI / 180) ** 2
    expect((onSphere / areaOfDegree - 1) * 100).toBeCloseTo(percent, 4)
  })
})

describe('area traps', () => {
  const jump: Position[] = [[179.9985, -16.8015], [-179.998, -16.801], [-179.998, -16.799], [179.9985, -16.7985], [179.9985, -16.8015]]

  it('reads a jump at ±180° as the short way round: 103 222.9 m², not 10 652 862 865 m²', () => {
    expect(measurePolygon({ type: 'Polygon', coordinates: [jump] }).areaM2).toBeCloseTo(103222.9, 1)
  })

  it('refuses an open ring instead of dropping a corner', () => {
    expect(() => measurePolygon({ type: 'Polygon', coordinates: [jump.slice(0, -1)] })).toThrow(RangeError)
  })

  it('gives the same for either direction and any first corner', () => {
    const expected = measurePolygon({ type: 'Polygon', coordinates: [jump] })
    const open = jump.slice(0, -1)
    const turned = [...open.slice(2), ...open.slice(0, 2), ...open.slice(2, 3)]
    for (const ring of [jump.toReversed(), turned]) {
      const measure = measurePolygon({ type: 'Polygon', coordinates: [ring] })
      expect(relative(measure.areaM2, expected.areaM2)).toBeLessThan(1e-9)
      expect(relative(measure.perimeterM, expected.perimeterM)).toBeLessThan(1e-9)
    }
  })
})

function fromLatLon(corners: number[][]): Boundary {
  const ring = corners.map(([lat = 0, lon = 0]): Position => [lon, lat])
  return { type: 'Polygon', coordinates: [[...ring, ...ring.slice(0, 1)]] }
}

function moveFirstCorner(geometry: Boundary): Boundary {
  const [[first, ...holes] = [], ...others] = geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates
  const ring = first ?? []
  const extent = (axis: 0 | 1): number => Math.max(...ring.map((place) => place[axis])) - Math.min(...ring.map((place) => place[axis]))
  const [lon = 0, lat = 0] = ring[0] ?? []
  const moved: Position = [lon + extent(0) / 100, lat - extent(1) / 60]
  return { type: 'MultiPolygon', coordinates: [[[moved, ...ring.slice(1, -1), moved], ...holes], ...others] }
}
