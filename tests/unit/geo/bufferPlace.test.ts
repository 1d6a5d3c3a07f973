import geodesic from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import { bufferPlace } from '../../../shared/geo/bufferPlace.ts'
import type { Boundary, PlaceGeometry, Position } from '../../../shared/geo/geometryTypes.ts'

const ringsOf = (boundary: Boundary | null): Position[][] => (boundary === null ? [] : boundary.type === 'Polygon' ? boundary.coordinates : boundary.coordinates.flat())
/** Metres on the WGS84 ellipsoid by GeographicLib (Karney, Journal of Geodesy 87, 2013). */
const metres = (a: Position, b: Position): number => geodesic.Geodesic.WGS84.Inverse(a[1], a[0], b[1], b[0]).s12 ?? Number.NaN

describe('the ground kept clear round a thing', () => {
  it.each([[-123.31, 44.6], [175.5, -37.1], [10, 68], [0, 0]] as const)('is a circle about a point at %d, %d', (lon, lat) => {
    const [ring = []] = ringsOf(bufferPlace({ type: 'Point', coordinates: [lon, lat] }, 30))
    expect(ring.length).toBeGreaterThan(40)
    for (const corner of ring) expect(Math.abs(metres([lon, lat], corner) / 30 - 1)).toBeLessThan(0.006)
  })

  it('keeps its distance along both sides of a line and round its ends', () => {
    const line: PlaceGeometry = { type: 'LineString', coordinates: [[-123.31, 44.6], [-123.31, 44.601]] }
    const [ring = []] = ringsOf(bufferPlace(line, 15))
    const lons = ring.map(([lon]) => lon)
    const lats = ring.map(([, lat]) => lat)
    const middle: Position = [-123.31, 44.6005]
    expect(metres(middle, [Math.max(...lons), 44.6005])).toBeCloseTo(15, 0)
    expect(metres(middle, [Math.min(...lons), 44.6005])).toBeCloseTo(15, 0)
    expect(metres([-123.31, 44.6], [-123.31, Math.min(...lats)])).toBeCloseTo(15, 0)
  })

  it('surrounds an outline and leaves none of its ground out', () => {
    const square: PlaceGeometry = { type: 'Polygon', coordinates: [[[0, 50], [0.001, 50], [0.001, 50.001], [0, 50.001], [0, 50]]] }
    const rings = ringsOf(bufferPlace(square, 8))
    expect(rings).toHaveLength(1)
    expect(Math.min(...(rings[0] ?? []).map(([lon]) => lon))).toBeLessThan(0)
  })

  it.each([0, -3, Number.NaN, Infinity])('refuses a distance of %d', (distance) => {
    expect(() => bufferPlace({ type: 'Point', coordinates: [0, 0] }, distance)).toThrow(RangeError)
  })
})
