import type { Certificate } from '../contract/certificate.ts'
import { addDays } from '../time/calendar.ts'

/** A certificate and the civil days on which it is the farm's; null where no day bounds it. */
export interface CertificateRun { certificate: Certificate; from: string | null; until: string | null }

/**
 * The days on which each certificate is the farm's, oldest first. One is in force at a time: it runs to its last day, or to the day before
 * the next begins. Those taken back run on no day.
 */
export function certificateRuns(certificates: readonly Certificate[]): CertificateRun[] {
  const standing = inOrder(certificates)
  return standing.flatMap((certificate, index) => {
    const { validFrom, validUntil } = certificate
    const next = standing[index + 1]?.validFrom ?? null
    const last = next === null ? null : addDays(next, -1)
    const until = last === null || (validUntil !== null && validUntil < last) ? validUntil : last
    return validFrom !== null && until !== null && until < validFrom ? [] : [{ certificate, from: validFrom, until }]
  })
}

/**
 * Which certificates end before their own last day because the next begins, by id: the one that stands in their place, and from which day.
 * `never`: both begin on the same day, so that the earlier one stands on none.
 */
export function certificatesReplaced(certificates: readonly Certificate[]): Map<string, { by: Certificate; from: string; never: boolean }> {
  const standing = inOrder(certificates)
  return new Map(standing.flatMap(({ id, validFrom, validUntil }, index) => {
    const from = standing[index + 1]?.validFrom ?? null
    // Of several that begin on that day the one written down last.
    const by = standing.findLast((each) => each.validFrom === from)
    if (by === undefined || from === null || (validUntil !== null && validUntil < from)) return []
    return [[id, { by, from, never: validFrom === from }] as const]
  }))
}

/** Those that were not taken back, by their first day. */
const inOrder = (certificates: readonly Certificate[]): Certificate[] =>
  certificates.filter(({ withdrawn }) => withdrawn === null).sort((one, other) => (one.validFrom ?? '').localeCompare(other.validFrom ?? ''))

/** The runs that touch the civil days `from` to `to`, oldest first. */
export function certificatesDuring(certificates: readonly Certificate[], { from, to }: { from: string; to: string }): CertificateRun[] {
  return certificateRuns(certificates).filter((run) => (run.from === null || run.from <= to) && (run.until === null || run.until >= from))
}

/** The one in force on a civil day, or null. */
export function certificateOn(certificates: readonly Certificate[], day: string): Certificate | null {
  return certificatesDuring(certificates, { from: day, to: day })[0]?.certificate ?? null
}

/**
 * Until when the farm is certified without a gap: by the one in force on a civil day, and those that follow it day upon day. Where none is in
 * force, by the one that ended last.
 * @returns the last of them, and its last day or null where none is written down; null where none has begun.
 */
export function certifiedUntil(certificates: readonly Certificate[], day: string): { number: string; expiresOn: string | null } | null {
  const runs = certificateRuns(certificates)
  const begun = runs.findLastIndex(({ from }) => from === null || from <= day)
  let last = runs[begun]
  if (last === undefined) return null
  for (const next of runs.slice(begun + 1)) {
    if (last.until === null || next.from === null || next.from > addDays(last.until, 1)) break
    last = next
  }
  return { number: last.certificate.number, expiresOn: last.until }
}

/** Whether one certificate or another was in force on every day from `from` to `to`. @param runs as `certificatesDuring` gives them. */
export function coverEveryDay(runs: readonly CertificateRun[], { from, to }: { from: string; to: string }): boolean {
  let reached = addDays(from, -1)
  for (const run of runs) {
    if (run.from !== null && run.from > addDays(reached, 1)) return false
    if (run.until === null) return true
    reached = run.until
  }
  return reached >= to
}
