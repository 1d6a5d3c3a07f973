import { addDays } from '../time/calendar.ts'

/** Papers and calibrations are named this many days before they end. */
export const DUE_DAYS = 30

/** One thing that ends or is due: what it is, whose, on which day, and whether that is past. */
export interface DueThing {
  kind: 'certificate' | 'calibration' | 'uncalibrated' | 'training' | 'licence'
  /** Key among those of its kind. */
  id: string
  /** Code of the sprayer, name of the person, number of the certificate. */
  name: string
  /** Title of the paper; empty where the kind says it all. */
  what: string
  /** Civil date; null for a sprayer that was never calibrated. */
  on: string | null
  isPast: boolean
}

export interface DueFacts {
  /** Civil date on the farm. */
  today: string
  certificate: { number: string; expiresOn: string | null } | null
  sprayers: readonly { id: string; code: string; retired: unknown; calibration: { dueOn: string } | null }[]
  papers: readonly { id: string; kind: 'training' | 'licence'; title: string; person: { name: string }; expiresOn: string | null }[]
}

/**
 * What ends or falls due within `DUE_DAYS` or has already, soonest first; a day that has come is not past. Sprayers out of use are due nothing; those
 * nobody ever calibrated come last.
 */
export function dueSoon({ today, certificate, sprayers, papers }: DueFacts): DueThing[] {
  const until = addDays(today, DUE_DAYS)
  const things: DueThing[] = [
    ...(certificate === null ? [] : [{ kind: 'certificate', id: 'certificate', name: certificate.number, what: '', on: certificate.expiresOn } as const]),
    ...sprayers.filter(({ retired, calibration }) => retired === null && calibration !== null)
      .map(({ id, code, calibration }) => ({ kind: 'calibration', id, name: code, what: '', on: calibration?.dueOn ?? null } as const)),
    ...papers.map(({ id, kind, title, person, expiresOn }) => ({ kind, id, name: person.name, what: title, on: expiresOn })),
  ].flatMap((thing) => (thing.on !== null && thing.on <= until ? [{ ...thing, isPast: thing.on < today }] : []))
  const never = sprayers.filter(({ retired, calibration }) => retired === null && calibration === null)
  return [
    ...things.sort((one, other) => (one.on ?? '').localeCompare(other.on ?? '') || one.name.localeCompare(other.name)),
    ...never.map(({ id, code }): DueThing => ({ kind: 'uncalibrated', id, name: code, what: '', on: null, isPast: false })),
  ]
}
