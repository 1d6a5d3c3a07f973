import { Temporal } from 'temporal-polyfill'

/**
 * The civil date of an instant in a zone, YYYY-MM-DD.
 * @param zone IANA name. @param instantIso RFC 3339 with an offset. @throws {RangeError} if one of them is none.
 */
export function civilDateIn(zone: string, instantIso: string): string {
  return Temporal.Instant.from(instantIso).toZonedDateTimeISO(zone).toPlainDate().toString()
}

/**
 * The clock time of an instant in a zone, HH:MM, seconds dropped.
 * @param zone IANA name. @param instantIso RFC 3339 with an offset. @throws {RangeError} if one of them is none.
 */
export function civilTimeIn(zone: string, instantIso: string): string {
  return Temporal.Instant.from(instantIso).toZonedDateTimeISO(zone).toPlainTime().toString({ smallestUnit: 'minute' })
}
