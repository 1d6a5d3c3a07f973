import geodesic from 'geographiclib-geodesic'
import { expect, it } from 'vitest'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { lineLengthM } from '../../../shared/geo/lineLengthM.ts'

// GeographicLib (Karney, Journal of Geodesy 87, 2013) as the reference.
it.each<[Position, Position]>([[[-123.31, 44.6], [-123.309, 44.61]], [[175.5, -37.1], [175.51, -37.11]], [[10, 68], [10.02, 68.001]], [[0, 0], [0.01, 0.01]]])('is the geodesic length of %o to %o', (a, b) => {
  const expected = geodesic.Geodesic.WGS84.Inverse(a[1], a[0], b[1], b[0]).s12 ?? Number.NaN
  expect(Math.abs(lineLengthM([a, b]) / expected - 1)).toBeLessThan(1e-5)
  expect(lineLengthM([a, b, a])).toBeCloseTo(2 * lineLengthM([a, b]), 9)
})

it('is nothing for a single place', () => expect(lineLengthM([[4, 5]])).toBe(0))
