import { describe, expect, it } from 'vitest'
import { outsideShare } from '../../../shared/geo/outsideShare.ts'
import { partArea } from '../../../shared/geo/partArea.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'

const square = (west: number, east: number): Boundary => ({
  type: 'Polygon', coordinates: [[[west, 44.6], [east, 44.6], [east, 44.601], [west, 44.601], [west, 44.6]]],
})

describe('ground treated on a block', () => {
  it.each([
    { part: { kind: 'whole' as const }, expected: 8_815.4 },
    { part: { kind: 'fraction' as const, fraction: '0.25' }, expected: 2_203.85 },
    { part: { kind: 'rows' as const, from: 3, to: 6, of: 20 }, expected: 1_763.08 },
    { part: { kind: 'beds' as const, from: 1, to: 1, of: 1 }, expected: 8_815.4 },
  ])('$part.kind', ({ part, expected }) => {
    expect(partArea(part, 8_815.4)).toBeCloseTo(expected, 9)
  })

  it('measures what was drawn, and nothing while it is no ring', () => {
    const half = square(-123.31, -123.309)
    expect(partArea({ kind: 'drawn', geometry: half as never }, 1)).toBe(measurePolygon(half).areaM2)
    expect(partArea({ kind: 'drawn', geometry: { type: 'Polygon', coordinates: [[[0, 0], [1, 1]]] } }, 1)).toBe(0)
  })
})

describe('how much of a part lies outside its block', () => {
  it.each([
    { name: 'inside', part: square(-123.3095, -123.309), expected: 0 },
    { name: 'half outside', part: square(-123.311, -123.309), expected: 0.5 },
    { name: 'elsewhere', part: square(-123.4, -123.39), expected: 1 },
  ])('$name', ({ part, expected }) => {
    expect(outsideShare(part, square(-123.31, -123.308))).toBeCloseTo(expected, 4)
  })
})
