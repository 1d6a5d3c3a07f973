const DAY_MS = 86_400_000

/**
 * Days from 1 January 1970 to a civil date: whole, whatever clocks do in between.
 * @param civilDate YYYY-MM-DD. @throws {RangeError} if it is no date.
 */
export function toDayNumber(civilDate: string): number {
  const days = Date.parse(`${civilDate}T00:00:00Z`) / DAY_MS
  if (!Number.isInteger(days)) throw new RangeError(`not a civil date: ${civilDate.slice(0, 80)}`)
  return days
}

/** The civil date so many days after 1 January 1970, YYYY-MM-DD. @throws {RangeError} if it is no whole number of days. */
export function fromDayNumber(days: number): string {
  return new Date(days * DAY_MS).toISOString().slice(0, 10)
}
