import type { Language } from './translate.ts'

const NBSP = '\u00a0'

/**
 * A civil date in words, "16 June 2026" or "16 de junio de 2026".
 * @param civilDate YYYY-MM-DD; @param weekday whether the day's name stands before it; @param year false leaves the year out.
 * @throws {RangeError} if it is no date.
 */
export function formatDay(
  language: Language,
  civilDate: string,
  { weekday = false, year = true }: { weekday?: boolean; year?: boolean } = {},
): string {
  const format = new Intl.DateTimeFormat(language === 'en' ? 'en-GB' : 'es', {
    timeZone: 'UTC',
    day: 'numeric',
    month: 'long',
    ...(year && { year: 'numeric' }),
    ...(weekday && { weekday: 'long' }),
  })
  return format.format(new Date(`${civilDate}T00:00:00Z`)).replace(/[\u202f\u2009]/g, NBSP)
}
