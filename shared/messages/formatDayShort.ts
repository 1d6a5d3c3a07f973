import type { Language } from './translate.ts'

/**
 * A civil date for a ledger, "16 Jun" or "16 jun".
 * @param civilDate YYYY-MM-DD. @throws {RangeError} if it is no date.
 */
export function formatDayShort(language: Language, civilDate: string): string {
  const format = new Intl.DateTimeFormat(language === 'en' ? 'en-GB' : 'es', { timeZone: 'UTC', day: 'numeric', month: 'short' })
  return format.format(new Date(`${civilDate}T00:00:00Z`)).replace(/[\u202f\u2009 ]/g, '\u00a0')
}
