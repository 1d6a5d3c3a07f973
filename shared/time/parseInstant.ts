import * as Instant from 'temporal-polyfill/fns/Instant'

export type ParsedInstant =
  | { ok: true; instant: string }
  | { ok: false; problem: { id: 'time.zone_needed' | 'time.invalid' | 'time.range'; params: Record<string, string | number> } }

const SHAPE = /^(\d{4})-\d{2}-\d{2}T([01]\d|2[0-3]):[0-5]\d:[0-5]\d(\.\d{1,9})?(Z|[+-]([01]\d|2[0-3]):[0-5]\d)?$/

/**
 * An instant of a file or another program: RFC 3339 with its offset, years 1970 to 2199, as UTC text. Without offset it is
 * `time.zone_needed`; no such day or time (30 February, 23:59:60), or any other text, is `time.invalid`. Never throws.
 */
export function parseInstant(text: string): ParsedInstant {
  const params = { text: text.slice(0, 80) }
  const shape = SHAPE.exec(text)
  if (!shape) return { ok: false, problem: { id: 'time.invalid', params } }
  const year = Number(shape[1])
  if (year < 1970 || year > 2199) return { ok: false, problem: { id: 'time.range', params } }
  if (shape[4] === undefined) return { ok: false, problem: { id: 'time.zone_needed', params } }
  try {
    return { ok: true, instant: Instant.toString(Instant.fromString(text)) }
  } catch {
    // No such day in the calendar: the reader's only answer is to throw.
    return { ok: false, problem: { id: 'time.invalid', params } }
  }
}
