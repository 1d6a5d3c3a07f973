import * as Instant from 'temporal-polyfill/fns/Instant'
import * as ZonedDateTime from 'temporal-polyfill/fns/ZonedDateTime'

/**
 * An instant as RFC 3339 with the offset that clocks in a zone had then, to the second.
 * @param zone IANA name. @param instantIso RFC 3339 with an offset. @throws {RangeError} if one of them is none.
 * @example isoInZone('America/Los_Angeles', '2026-06-16T13:05:00Z') // '2026-06-16T06:05:00-07:00'
 */
export function isoInZone(zone: string, instantIso: string): string {
  const moment = Instant.toZonedDateTimeISO(Instant.fromString(instantIso), zone)
  return ZonedDateTime.toString(moment, { timeZoneName: 'never', smallestUnit: 'second' })
}
