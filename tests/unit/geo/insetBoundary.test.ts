import { describe, expect, it } from 'vitest'
import { insetBoundary } from '../../../shared/geo/insetBoundary.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { buildPolygon, buildSquare } from './buildRing.ts'

describe('insetBoundary', () => {
  it('takes a strip of that width off every side', () => {
    const square = buildPolygon(buildSquare(10, 45))
    const { areaM2, perimeterM } = measurePolygon(square)
    const inset = insetBoundary(square, 5)
    // A strip of 5 m along the edges, counted twice in the four corners.
    expect(inset && measurePolygon(inset).areaM2).toBeGreaterThan((areaM2 - perimeterM * 5 + 100) * 0.994)
    expect(inset && measurePolygon(inset).areaM2).toBeLessThan((areaM2 - perimeterM * 5 + 100) * 1.006)
  })

  it('leaves nothing of ground that is narrower', () => {
    expect(insetBoundary(buildPolygon(buildSquare(10, 45, 0.0001)), 6)).toBeNull()
  })

  it.each([0, -1, Number.NaN])('refuses %s metres', (metres) => {
    expect(() => insetBoundary(buildPolygon(buildSquare(10, 45)), metres)).toThrow(RangeError)
  })
})
