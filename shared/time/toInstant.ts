import { getISO } from 'temporal-polyfill/fns/Calendar'
import * as Instant from 'temporal-polyfill/fns/Instant'
import * as PlainDateTime from 'temporal-polyfill/fns/PlainDateTime'
import * as ZonedDateTime from 'temporal-polyfill/fns/ZonedDateTime'
import { isZone } from './isZone.ts'

export interface CivilMoment {
  /** YYYY-MM-DD. */
  date: string
  /** HH:MM or HH:MM:SS. */
  time: string
  /** IANA name. */
  zone: string
  /** "+02:00"; picks one of two where the clock shows a time twice. */
  offset?: string
}

export interface InstantCandidate { instant: string; offset: string }

export type InstantResult =
  | { ok: true; instant: string }
  | {
      ok: false
      problem: { id: 'time.nonexistent' | 'time.ambiguous' | 'time.invalid'; params: Record<string, string | number> }
      /** Both instants a repeated clock time may mean, earlier first; empty but for `time.ambiguous`. */
      candidates: InstantCandidate[]
    }

/**
 * The instant of a date and clock time on the land, as RFC 3339 in UTC. A time the clock skips or shows twice is not guessed.
 * Never throws: no such date, time, zone or offset is `time.invalid`.
 */
export function toInstant({ date, time, zone, offset }: CivilMoment): InstantResult {
  const params = { date: date.slice(0, 20), time: time.slice(0, 20), zone: zone.slice(0, 60) }
  const local = readLocal(date, time)
  if (local === null || !isZone(zone)) return refuse('time.invalid', params)
  const candidates = candidatesOf(local, zone)
  const [earlier, later] = candidates
  if (!earlier) return refuse('time.nonexistent', params)
  if (offset !== undefined) {
    const chosen = candidates.find((candidate) => candidate.offset === offset)
    return chosen ? { ok: true, instant: chosen.instant } : refuse('time.invalid', { ...params, offset: offset.slice(0, 10) })
  }
  if (!later) return { ok: true, instant: earlier.instant }
  return { ok: false, problem: { id: 'time.ambiguous', params: { ...params, earlier: earlier.offset, later: later.offset } }, candidates }
}

function readLocal(date: string, time: string): PlainDateTime.Record | null {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(date) || !/^([01]\d|2[0-3]):[0-5]\d(:[0-5]\d)?$/.test(time)) return null
  try {
    return PlainDateTime.fromString(`${date}T${time}`, getISO)
  } catch {
    // 30 February: the reader's only answer is to throw.
    return null
  }
}

/** No instant where the clock skips the time, one as a rule, two where it shows it twice. */
function candidatesOf(local: PlainDateTime.Record, zone: string): InstantCandidate[] {
  const both = (['earlier', 'later'] as const).map((disambiguation) => PlainDateTime.toZonedDateTime(local, zone, { disambiguation }))
  const real = both.filter((moment) => PlainDateTime.equals(ZonedDateTime.toPlainDateTime(moment), local))
  const distinct = real.filter((moment, index) => index === 0 || moment.epochMilliseconds !== real[0]?.epochMilliseconds)
  return distinct.map((moment) => ({ instant: Instant.toString(ZonedDateTime.toInstant(moment)), offset: ZonedDateTime.offset(moment) }))
}

function refuse(id: 'time.nonexistent' | 'time.invalid', params: Record<string, string | number>): InstantResult {
  return { ok: false, problem: { id, params }, candidates: [] }
}
