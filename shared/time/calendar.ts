import { getISO } from 'temporal-polyfill/fns/Calendar'
import * as PlainDate from 'temporal-polyfill/fns/PlainDate'

/**
 * A civil date some days later, or earlier for a negative number.
 * @param civilDate YYYY-MM-DD. @param days whole. @throws {RangeError} if it is no date.
 */
export function addDays(civilDate: string, days: number): string {
  return PlainDate.toString(PlainDate.addDays(readDate(civilDate), days))
}

/** @throws {RangeError} if it is no date of the calendar. */
export function readDate(civilDate: string): PlainDate.Record {
  return PlainDate.fromString(civilDate, getISO)
}
