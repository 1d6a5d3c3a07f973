import { describe, expect, it } from 'vitest'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { niceScaleBar, toPlan } from '../../../shared/geo/projectToPlan.ts'
import { REFERENCE_POLYGONS } from '../../reference/geo/referencePolygons.ts'
import { buildPolygon, buildSquare } from './buildRing.ts'

describe('toPlan', () => {
  it.each(REFERENCE_POLYGONS.filter(({ id }) => !['R07', 'R16', 'R17'].includes(id)))('draws $id to scale within 0.1 %', ({ geometry }) => {
    const lengths = toPlan({ geometry }).rings.map(({ points }) =>
      points.slice(1).reduce((sum, [x, y], index) => sum + Math.hypot(x - (points[index]?.[0] ?? 0), y - (points[index]?.[1] ?? 0)), 0))
    const drawn = lengths.reduce((sum, length) => sum + length, 0)
    expect(Math.abs(drawn / measurePolygon(geometry).perimeterM - 1)).toBeLessThan(1e-3)
  })

  it('gives extent, holes and an origin others can share', () => {
    const geometry = buildPolygon(buildSquare(10, 0, 0.002), buildSquare(10.0005, 0.0005, 0.001))
    const plan = toPlan({ geometry, origin: [10, 0] })
    expect(plan.rings.map(({ isHole }) => isHole)).toEqual([false, true])
    expect({ minX: plan.minX, minY: plan.minY, origin: plan.origin }).toEqual({ minX: 0, minY: 0, origin: [10, 0] })
    // One degree on the equator of WGS84 is 111 319.491 m east and 110 574.276 m north.
    expect(plan.widthM).toBeCloseTo(222.639, 3)
    expect(plan.heightM).toBeCloseTo(221.149, 3)
  })
})

describe('niceScaleBar', () => {
  it.each([[123, 100], [99, 50], [50, 50], [49.9, 20], [2, 2], [1.9, 1], [0.3, 0.2], [1000, 1000], [999, 500]])('fits %d m with %d m', (room, bar) => {
    expect(niceScaleBar(room)).toBe(bar)
  })

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('refuses %d', (room) => {
    expect(() => niceScaleBar(room)).toThrow(RangeError)
  })
})
