import { fromDayNumber, toDayNumber } from '../time/dayNumber.ts'

/** 1 January 1970 was a Thursday; Monday counts as 0. */
const THURSDAY = 3
const WEEK = 7

/** Monday 0 to Sunday 6. @throws {RangeError} if it is no date. */
export function weekdayOf(civilDate: string): number {
  return ((toDayNumber(civilDate) + THURSDAY) % WEEK + WEEK) % WEEK
}

/** The week of a civil date by ISO 8601: the one with its Thursday decides the year. @throws {RangeError} if it is no date. */
export function weekOf(civilDate: string): number {
  const thursday = toDayNumber(civilDate) - weekdayOf(civilDate) + THURSDAY
  const firstDay = toDayNumber(`${fromDayNumber(thursday).slice(0, 4)}-01-01`)
  return Math.floor((thursday - firstDay) / WEEK) + 1
}
