import { describe, expect, it } from 'vitest'
import { seasonOf } from '../../../shared/time/seasonOf.ts'

describe('seasonOf', () => {
  it.each([
    ['2026-06-30', '07-01', 2025], ['2026-07-01', '07-01', 2026], ['2026-12-31', '07-01', 2026], ['2027-01-01', '07-01', 2026],
    ['2026-01-01', '01-01', 2026], ['2026-12-31', '01-01', 2026], ['2028-02-29', '03-01', 2027], ['2028-02-29', '02-28', 2028],
  ])('%s with a season from %s is in %d', (date, start, season) => {
    expect(seasonOf(date, start)).toBe(season)
  })

  it.each([['2026-02-30', '07-01'], ['2026-06-30', '02-29'], ['2026-06-30', '13-01'], ['2026-06-30', '7-1'], ['2026-06-30T00:00:00Z', '07-01'], ['', '']])('refuses %s, %s', (date, start) => {
    expect(() => seasonOf(date, start)).toThrow(RangeError)
  })
})
