import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { formatPoints } from '../../../shared/geo/formatPoints.ts'
import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { parsePoints } from '../../../shared/geo/parsePoints.ts'

const RUNS = { seed: 20_260_616, numRuns: 500 }

describe('parsePoints', () => {
  it.each([
    ['51.5, -0.12', [-0.12, 51.5]],
    ['51.5 -0.12', [-0.12, 51.5]],
    ['51.5; \u22120.12', [-0.12, 51.5]],
    ['51,5; -0,12', [-0.12, 51.5]],
    ['51,5 -0,12', [-0.12, 51.5]],
    ['51, 0', [0, 51]],
    ['51.5°N 0.12°W', [-0.12, 51.5]],
    ['51°30\'0"N 0°7\'12"W', [-0.12, 51.5]],
    ['51° 30′ 0″ N, 0° 7′ 12″ O', [-0.12, 51.5]],
    ['N51 30 0, W0 7 12', [-0.12, 51.5]],
    ['0°7\'12"W 51°30\'0"N', [-0.12, 51.5]],
    ["51º30.0' n 0º7.2' w", [-0.12, 51.5]],
    ["-37°30', 175°30'", [175.5, -37.5]],
    ['-0°30\', 0', [0, -0.5]],
    ['90, 180', [180, 90]],
  ])('reads %o', (text, [lon = 0, lat = 0]) => {
    const { points, findings } = parsePoints(text)
    expect(findings).toEqual([])
    expect(points[0]?.[0]).toBeCloseTo(lon, 12)
    expect(points[0]?.[1]).toBeCloseTo(lat, 12)
  })

  it.each([
    ['hello', 'points.unreadable'], ['51.5', 'points.unreadable'], ['1, 2, 3', 'points.unreadable'], ['--5, 3', 'points.unreadable'], ['5-3', 'points.unreadable'],
    ['51N 52S', 'points.unreadable'], ['-51N, 0W', 'points.unreadable'], ['51"30\'N 0W', 'points.unreadable'], ['51.5 30 N, 0 W', 'points.unreadable'],
    ['1e3, 4', 'points.unreadable'], ['٥١, ٠', 'points.unreadable'], ['N N 5 5', 'points.unreadable'], [',', 'points.unreadable'], ['5,', 'points.unreadable'],
    ['90.1, 0', 'points.lat_out_of_range'], ['0, 180.1', 'points.lon_out_of_range'], ["51°60'N 0°0'E", 'points.minutes_out_of_range'],
  ])('finds fault with %o', (text, code) => {
    expect(parsePoints(text)).toMatchObject({ points: [], findings: [{ line: 1, code }] })
  })

  it('counts lines from 1, passes over empty ones and reads the rest', () => {
    expect(parsePoints('45, 10\r\n\r\nno\n45.001, 10\r')).toEqual({
      points: [[10, 45], [10, 45.001]],
      findings: [{ line: 3, code: 'points.unreadable', params: { text: 'no' } }],
    })
  })

  it('stops after 5 000 points', () => {
    const { points, findings } = parsePoints('45, 10\n'.repeat(6_000))
    expect(points).toHaveLength(5_000)
    expect(findings).toEqual([{ line: 5_001, code: 'points.too_many', params: { max: 5_000 } }])
  })

  it('reads back what formatPoints writes', () => {
    const place = fc.tuple(fc.integer({ min: -1_800_000_000, max: 1_800_000_000 }), fc.integer({ min: -900_000_000, max: 900_000_000 }))
    fc.assert(fc.property(fc.array(place.map(([x, y]): Position => [x / 1e7 + 0, y / 1e7 + 0])), (points) => {
      expect(parsePoints(formatPoints(points))).toEqual({ points, findings: [] })
    }), RUNS)
  })

  it('never throws, and every point is on the globe', () => {
    const typed = fc.oneof(fc.string(), fc.string({ unit: fc.constantFrom(...'0123456789.,;-+°\'" NSEWO\n') }))
    fc.assert(fc.property(typed, (text) => {
      for (const [lon, lat] of parsePoints(text).points) {
        expect(Math.abs(lon)).toBeLessThanOrEqual(180)
        expect(Math.abs(lat)).toBeLessThanOrEqual(90)
      }
    }), RUNS)
  })
})
