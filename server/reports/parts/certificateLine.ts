import type { Certificate } from '../../../shared/contract/certificate.ts'
import { formatDay } from '../../../shared/messages/formatDay.ts'
import { translate, type Language } from '../../../shared/messages/translate.ts'
import { certificatesDuring, coverEveryDay, type CertificateRun } from '../../../shared/season/certificateRuns.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'

interface Printed {
  certificates: readonly Certificate[]
  farm: { zone: string }
  language: Language
  printedAt: string
}
/** First and last civil day of the work that a document is about; null where it is about none. */
export type WorkDays = { from: string; to: string } | null

/**
 * What the running head says of the certificates in force while the work was done, as they are written down on the day of printing; empty
 * where on some day of it none was. A day that is not written down rules nothing out.
 */
export function certificateLine({ certificates, farm, language, printedAt }: Printed, work: WorkDays): string {
  const today = civilDateIn(farm.zone, printedAt)
  const span = work ?? { from: today, to: today }
  const runs = certificatesDuring(certificates, span)
  if (!coverEveryDay(runs, span)) return ''
  const named = runs.map((run, index) => nameRun(run, { language, isFirst: index === 0, isLast: index === runs.length - 1 }))
  return translate(language, 'pdf.running.certificate', { named: named.join('; '), day: formatDay(language, today) }, runs.length)
}

/** Number and certifier; where others came before or after, the days at which they changed. */
function nameRun({ certificate: { number, body }, from, until }: CertificateRun, { language, isFirst, isLast }: { language: Language; isFirst: boolean; isLast: boolean }): string {
  const words = [number, body]
  if (!isFirst && from !== null) words.push(translate(language, 'pdf.running.certificateFrom', { day: formatDay(language, from) }))
  else if (!isLast && until !== null) words.push(translate(language, 'pdf.running.certificateUntil', { day: formatDay(language, until) }))
  return words.join(', ')
}

/** The civil days over which instants of work go. */
export function workDays(zone: string, instants: readonly (string | null)[]): WorkDays {
  const days = instants.flatMap((instant) => (instant === null ? [] : [civilDateIn(zone, instant)])).sort()
  const [from] = days
  const to = days.at(-1)
  return from === undefined || to === undefined ? null : { from, to }
}
