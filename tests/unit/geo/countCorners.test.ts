import { describe, expect, it } from 'vitest'
import { countCorners } from '../../../shared/geo/countCorners.ts'
import type { Ring } from '../../../shared/geo/geometryTypes.ts'
import { totalAreaM2 } from '../../../shared/geo/totalAreaM2.ts'

const outer: Ring = [[0, 0], [4, 0], [4, 4], [0, 4], [0, 0]]
const hole: Ring = [[1, 1], [1, 2], [2, 1], [1, 1]]

describe('countCorners', () => {
  it('counts each corner of a ring once, holes and parts too', () => {
    expect(countCorners({ type: 'Polygon', coordinates: [outer] })).toBe(4)
    expect(countCorners({ type: 'Polygon', coordinates: [outer, hole] })).toBe(7)
    expect(countCorners({ type: 'MultiPolygon', coordinates: [[outer, hole], [outer]] })).toBe(11)
  })
})

describe('totalAreaM2', () => {
  it('adds areas and is 0 for no block', () => {
    expect(totalAreaM2([{ areaM2: 9_436.5 }, { areaM2: 12_114.25 }])).toBe(21_550.75)
    expect(totalAreaM2([])).toBe(0)
  })
})
