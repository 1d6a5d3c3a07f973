import geodesic from 'geographiclib-geodesic'
import { describe, expect, it } from 'vitest'
import { movePosition } from '../../../shared/geo/movePosition.ts'
import { isSameCorner } from '../../../shared/geo/isSameCorner.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'

/** Metres between two positions by Karney's inverse solution (2013) on WGS84. */
function metresBetween(a: Position, b: Position): number {
  return geodesic.Geodesic.WGS84.Inverse(a[1], a[0], b[1], b[0]).s12 ?? Number.NaN
}

describe('movePosition', () => {
  it.each([0, 25, -37, 44.6, 60])('moves by the metres asked at latitude %d', (lat) => {
    const start: Position = [-123.31, lat]
    expect(metresBetween(start, movePosition(start, 10, 0))).toBeCloseTo(10, 4)
    expect(metresBetween(start, movePosition(start, 0, -10))).toBeCloseTo(10, 4)
    expect(metresBetween(start, movePosition(start, 0.1, 0))).toBeCloseTo(0.1, 5)
  })

  it('goes east and north', () => {
    const [lon, lat] = movePosition([10, 50], 1, 1)
    expect(lon).toBeGreaterThan(10)
    expect(lat).toBeGreaterThan(50)
  })
})

describe('isSameCorner', () => {
  const corner: Position = [-123.31, 44.6]
  it('takes a second touch within 0.2 m for the same', () => {
    expect(isSameCorner(corner, movePosition(corner, 0.12, 0.1))).toBe(true)
  })
  it('tells corners a step of the cross apart', () => {
    expect(isSameCorner(corner, movePosition(corner, 1, 0))).toBe(false)
    expect(isSameCorner(corner, movePosition(corner, 0, 0.3))).toBe(false)
  })
})
