import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findSplitFaults } from '../../../shared/geo/findSplitFaults.ts'
import { isSameOutline } from '../../../shared/geo/isSameOutline.ts'
import { splitBoundary } from '../../../shared/geo/splitBoundary.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { anyBoundary, anyLine, lineAcross, RUNS } from './anyBoundary.ts'

const polygon = (...rings: Position[][]): Boundary => ({ type: 'Polygon', coordinates: rings })
const box = (west: number, south: number, east: number, north: number): Position[] => [[west, south], [east, south], [east, north], [west, north], [west, south]]
const turn = (ring: Position[], by: number): Position[] => {
  const corners = ring.slice(0, -1)
  const turned = [...corners.slice(by), ...corners.slice(0, by)]
  return [...turned, turned[0] ?? [0, 0]]
}

describe('isSameOutline', () => {
  const whole = polygon(box(0, 0, 1, 1), box(0.2, 0.2, 0.3, 0.3), box(0.6, 0.6, 0.7, 0.7))
  it('does not mind where rings start or in which order holes stand', () => {
    expect(isSameOutline(whole, polygon(turn(box(0, 0, 1, 1), 2), turn(box(0.6, 0.6, 0.7, 0.7), 3), box(0.2, 0.2, 0.3, 0.3)))).toBe(true)
    expect(isSameOutline(whole, { type: 'MultiPolygon', coordinates: [whole.coordinates as Position[][]] })).toBe(true)
  })
  it('sees one corner moved by the least that is kept, and a hole filled', () => {
    expect(isSameOutline(whole, polygon(box(0, 0, 1, 1.0000001), box(0.2, 0.2, 0.3, 0.3), box(0.6, 0.6, 0.7, 0.7)))).toBe(false)
    expect(isSameOutline(whole, polygon(box(0, 0, 1, 1), box(0.2, 0.2, 0.3, 0.3)))).toBe(false)
  })
})

describe('findSplitFaults', () => {
  const [W, S] = [-123.31, 44.61]
  const leaning = polygon([[W, S], [W + 0.0013, S + 0.0002], [W + 0.0011, S + 0.0012], [W, S + 0.001], [W, S]])
  // Cut at half of both long sides, rounded to the grid: neither end lies on its edge to the last digit.
  const low: Position = [Number((W + 0.00065).toFixed(7)), Number((S + 0.0001).toFixed(7))]
  const high: Position = [Number((W + 0.00055).toFixed(7)), Number((S + 0.0011).toFixed(7))]
  const [a, b, c, d] = (leaning.coordinates as Position[][])[0] as [Position, Position, Position, Position]
  const west = polygon([a, low, high, d, a])
  const east = polygon([low, b, c, high, low])

  it('takes parts whose cut ends off an edge by less than the grid', () => { expect(findSplitFaults(leaning, [west, east])).toEqual([]) })
  it('takes every cut that the tool of the map makes', () => {
    fc.assert(fc.property(anyBoundary, anyLine, (boundary, line) => {
      const { pieces, findings } = splitBoundary(boundary.geometry, lineAcross(boundary, line))
      fc.pre(findings.length === 0 && pieces.length > 1)
      expect(findSplitFaults(boundary.geometry, pieces)).toEqual([])
    }), { ...RUNS, numRuns: 120 })
  })
  it.each([
    { name: 'a part twice', parts: [west, west, east], code: 'split.overlap' },
    { name: 'a part missing', parts: [west], code: 'split.sum' },
    { name: 'a part beyond the block', parts: [west, east, polygon(box(W + 1, S, W + 1.001, S + 0.001))], code: 'split.outside' },
    { name: 'a corner 20 cm short', parts: [polygon([a, [low[0] - 0.0000025, low[1]], high, d, a]), east], code: 'split.sum' },
  ])('finds $name', ({ parts, code }) => { expect(findSplitFaults(leaning, parts).map((fault) => fault.code)).toContain(code) })
})
