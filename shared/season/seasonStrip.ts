import { addDays } from '../time/calendar.ts'

const DAY_MS = 86_400_000
const MONTHS = 12

/** A season by its first and last civil day. */
export interface SeasonSpan { from: string; to: string }

/** A span laid along a line of so many pixels. */
export interface Strip extends SeasonSpan { width: number }

/**
 * First and last day of a season, which is a year long.
 * @param season year it starts in. @param seasonStart MM-DD. @throws {RangeError} if there is no such day.
 * @example seasonSpan(2026, '03-01') // {from: '2026-03-01', to: '2027-02-28'}
 */
export function seasonSpan(season: number, seasonStart: string): SeasonSpan {
  return { from: addDays(`${season}-${seasonStart}`, 0), to: addDays(`${season + 1}-${seasonStart}`, -1) }
}

/** Where the middle of a civil day lies on the strip, pixels; null for a day outside it. */
export function placeDay(strip: Strip, day: string): number | null {
  if (day < strip.from || day > strip.to) return null
  return ((daysFrom(strip.from, day) + 0.5) / length(strip)) * strip.width
}

/** The first days of the months that begin on the strip, and where: the left edge of that day. */
export function placeMonths(strip: Strip): { day: string; x: number }[] {
  const year = Number(strip.from.slice(0, 4))
  const month = Number(strip.from.slice(5, 7))
  return Array.from({ length: MONTHS + 1 }, (_, index) => {
    const count = month - 1 + index
    return `${year + Math.floor(count / MONTHS)}-${String((count % MONTHS) + 1).padStart(2, '0')}-01`
  })
    .filter((day) => day >= strip.from && day <= strip.to)
    .map((day) => ({ day, x: (daysFrom(strip.from, day) / length(strip)) * strip.width }))
}

/**
 * Marks of days side by side: those nearer to each other than a mark is wide stand one above the other.
 * @param markWidth pixels. @returns those that lie on the strip, earliest first; `level` counts from 0 at the line.
 */
export function placeMarks<Mark extends { on: string }>(strip: Strip, marks: readonly Mark[], markWidth: number): (Mark & { x: number; level: number })[] {
  const ends: number[] = []
  return marks
    .flatMap((mark) => {
      const x = placeDay(strip, mark.on)
      return x === null ? [] : [{ ...mark, x }]
    })
    .sort((a, b) => a.x - b.x)
    .map((mark) => {
      const free = ends.findIndex((end) => end <= mark.x - markWidth / 2)
      const level = free === -1 ? ends.length : free
      ends[level] = mark.x + markWidth / 2
      return { ...mark, level }
    })
}

/** Spans of days on the strip, cut to it: left edge of the first day, right edge of the last. Those wholly outside fall away. */
export function placeSpans<Span extends { from: string; to: string }>(strip: Strip, spans: readonly Span[]): (Span & { x: number; width: number })[] {
  return spans
    .filter(({ from, to }) => from <= strip.to && to >= strip.from)
    .map((span) => {
      const from = span.from < strip.from ? strip.from : span.from
      const to = span.to > strip.to ? strip.to : span.to
      const x = (daysFrom(strip.from, from) / length(strip)) * strip.width
      return { ...span, x, width: ((daysFrom(from, to) + 1) / length(strip)) * strip.width }
    })
}

function daysFrom(one: string, other: string): number {
  return Math.round((Date.parse(other) - Date.parse(one)) / DAY_MS)
}

function length({ from, to }: SeasonSpan): number {
  return daysFrom(from, to) + 1
}
