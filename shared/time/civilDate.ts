import * as Instant from 'temporal-polyfill/fns/Instant'
import * as PlainDate from 'temporal-polyfill/fns/PlainDate'
import * as PlainTime from 'temporal-polyfill/fns/PlainTime'
import * as ZonedDateTime from 'temporal-polyfill/fns/ZonedDateTime'

/**
 * The civil date of an instant in a zone, YYYY-MM-DD.
 * @param zone IANA name. @param instantIso RFC 3339 with an offset. @throws {RangeError} if one of them is none.
 */
export function civilDateIn(zone: string, instantIso: string): string {
  return PlainDate.toString(ZonedDateTime.toPlainDate(Instant.toZonedDateTimeISO(Instant.fromString(instantIso), zone)))
}

/**
 * The clock time of an instant in a zone, HH:MM, seconds dropped.
 * @param zone IANA name. @param instantIso RFC 3339 with an offset. @throws {RangeError} if one of them is none.
 */
export function civilTimeIn(zone: string, instantIso: string): string {
  const time = ZonedDateTime.toPlainTime(Instant.toZonedDateTimeISO(Instant.fromString(instantIso), zone))
  return PlainTime.toString(time, { smallestUnit: 'minute' })
}
