import { Temporal } from 'temporal-polyfill'

/**
 * The civil date a piece of work ended on: that of its start, or the next day where its end shows an earlier time than its start.
 * @returns empty where there is no start date.
 */
export function endDate(start: { date: string; time: string }, endTime: string): string {
  if (start.date === '') return ''
  const isOvernight = start.time !== '' && endTime !== '' && endTime < start.time
  return isOvernight ? Temporal.PlainDate.from(start.date).add({ days: 1 }).toString() : start.date
}
