import * as PlainDate from 'temporal-polyfill/fns/PlainDate'
import { readDate } from './calendar.ts'

/**
 * The season of a civil date, named by the year it starts in.
 * @param civilDate YYYY-MM-DD. @param seasonStart first day of the season, MM-DD, not 29 February.
 * @throws {RangeError} if one of them is no date.
 * @example seasonOf('2026-06-30', '07-01') // 2025
 */
export function seasonOf(civilDate: string, seasonStart: string): number {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(civilDate)) throw new RangeError(`not a civil date: ${civilDate.slice(0, 80)}`)
  if (!/^\d{2}-\d{2}$/.test(seasonStart)) throw new RangeError(`not a month and day: ${seasonStart.slice(0, 80)}`)
  const date = readDate(civilDate)
  // 2023 is no leap year: 29 February throws here.
  const { month, day } = readDate(`2023-${seasonStart}`)
  const start = PlainDate.create(date.year, month, day)
  return PlainDate.compare(date, start) < 0 ? date.year - 1 : date.year
}
