import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { placeDay, placeMarks, placeMonths, placeSpans, seasonSpan } from '../../../shared/season/seasonStrip.ts'
import { addDays } from '../../../shared/time/calendar.ts'

const strip = { ...seasonSpan(2026, '03-01'), width: 365 }

describe('seasonSpan', () => {
  it.each([
    { season: 2026, start: '03-01', span: { from: '2026-03-01', to: '2027-02-28' } },
    // The February of a leap year ends a season that starts in March.
    { season: 2027, start: '03-01', span: { from: '2027-03-01', to: '2028-02-29' } },
    { season: 2026, start: '01-01', span: { from: '2026-01-01', to: '2026-12-31' } },
  ])('$season from $start', ({ season, start, span }) => { expect(seasonSpan(season, start)).toEqual(span) })
  it('refuses a start that is no day', () => { expect(() => seasonSpan(2026, '02-30')).toThrow(RangeError) })
})

describe('placeDay', () => {
  it('lies in the middle of its day and nowhere outside the season', () => {
    expect(placeDay(strip, '2026-03-01')).toBeCloseTo(0.5)
    expect(placeDay(strip, '2027-02-28')).toBeCloseTo(364.5)
    expect(placeDay(strip, '2026-02-28')).toBeNull()
    expect(placeDay(strip, '2027-03-01')).toBeNull()
  })
  it('keeps the order of days and stays on the strip', () => {
    fc.assert(fc.property(fc.nat(364), fc.nat(364), fc.integer({ min: 50, max: 2000 }), (a, b, width) => {
      const [x, y] = [a, b].map((days) => placeDay({ ...strip, width }, addDays(strip.from, days)) ?? Number.NaN) as [number, number]
      expect(x).toBeGreaterThan(0)
      expect(x).toBeLessThan(width)
      expect(Math.sign(x - y)).toBe(Math.sign(a - b))
    }))
  })
})

describe('placeMonths', () => {
  it('gives each month that begins on the strip its first day', () => {
    const months = placeMonths(strip)
    expect(months.map(({ day }) => day)).toEqual(['2026-03-01', '2026-04-01', '2026-05-01', '2026-06-01', '2026-07-01', '2026-08-01', '2026-09-01', '2026-10-01', '2026-11-01', '2026-12-01', '2027-01-01', '2027-02-01'])
    expect(months[1]?.x).toBeCloseTo(31)
  })
  it('leaves out the month a season starts in the middle of', () => {
    expect(placeMonths({ ...seasonSpan(2026, '02-15'), width: 365 }).map(({ day }) => day).at(0)).toBe('2026-03-01')
    expect(placeMonths({ ...seasonSpan(2026, '02-15'), width: 365 }).map(({ day }) => day).at(-1)).toBe('2027-02-01')
  })
})

describe('placeMarks', () => {
  it('stacks what would lie over each other and leaves out what is outside', () => {
    const marks = ['2026-05-10', '2026-05-09', '2026-05-30', '2025-05-10'].map((on, id) => ({ id, on }))
    expect(placeMarks(strip, marks, 9).map(({ id, level }) => [id, level])).toEqual([[1, 0], [0, 1], [2, 0]])
  })
  it('never lays two marks of one level over each other, and loses none of the season', () => {
    fc.assert(fc.property(fc.array(fc.nat(364), { maxLength: 60 }), fc.integer({ min: 1, max: 30 }), (days, markWidth) => {
      const placed = placeMarks(strip, days.map((count) => ({ on: addDays(strip.from, count) })), markWidth)
      expect(placed).toHaveLength(days.length)
      for (const [index, one] of placed.entries()) {
        for (const other of placed.slice(index + 1)) {
          if (one.level === other.level) expect(Math.abs(one.x - other.x)).toBeGreaterThanOrEqual(markWidth - 1e-9)
        }
      }
    }))
  })
})

describe('placeSpans', () => {
  it.each([
    { name: 'whole days', span: { from: '2026-03-02', to: '2026-03-03' }, x: 1, width: 2 },
    { name: 'cut at its beginning', span: { from: '2026-01-01', to: '2026-03-01' }, x: 0, width: 1 },
    { name: 'cut at its end', span: { from: '2027-02-28', to: '2027-05-01' }, x: 364, width: 1 },
  ])('$name', ({ span, x, width }) => {
    const [placed] = placeSpans(strip, [span])
    expect(placed?.x).toBeCloseTo(x)
    expect(placed?.width).toBeCloseTo(width)
  })
  it('leaves out what lies outside', () => { expect(placeSpans(strip, [{ from: '2025-01-01', to: '2026-02-28' }, { from: '2027-03-01', to: '2027-03-02' }])).toEqual([]) })
})
