import type { Certificate } from '../../../shared/contract/farmProfile.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'

interface Printed {
  certificate: Certificate | null
  farm: { zone: string }
  language: Language
  printedAt: string
}
/** First and last civil day of the work that a document is about; null where it is about none. */
export type WorkDays = { from: string; to: string } | null

/**
 * What the running head says of the farm's certificate, as it is written down on the day of printing; empty where the farm has none, or
 * where it did not run on every day of the work. A day that is not written down rules nothing out.
 */
export function certificateLine({ certificate, farm, language, printedAt }: Printed, work: WorkDays): string {
  if (certificate === null) return ''
  const { number, body, issuedOn, expiresOn } = certificate
  const today = civilDateIn(farm.zone, printedAt)
  const { from, to } = work ?? { from: today, to: today }
  if ((issuedOn !== null && from < issuedOn) || (expiresOn !== null && to > expiresOn)) return ''
  return translate(language, 'pdf.running.certificate', { number, body, day: formatDay(language, today) })
}

/** The civil days over which instants of work go. */
export function workDays(zone: string, instants: readonly (string | null)[]): WorkDays {
  const days = instants.flatMap((instant) => (instant === null ? [] : [civilDateIn(zone, instant)])).sort()
  const [from] = days
  const to = days.at(-1)
  return from === undefined || to === undefined ? null : { from, to }
}
