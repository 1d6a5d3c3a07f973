const MINUTE_MS = 60_000
const HOUR_MS = 60 * MINUTE_MS
const DAY_MS = 24 * HOUR_MS

/** How long a session may stand in all, and how long unused; milliseconds. */
interface Limits { span: number; idle: number }

/** Of most people: a phone in the rows is not asked every morning, one that lay in a drawer is. */
const BY_PASSWORD: Limits = { span: 30 * DAY_MS, idle: 14 * DAY_MS }
/** Of whoever has a second factor, or leads or certifies a farm that asks one. */
const BY_FACTOR: Limits = { span: 24 * HOUR_MS, idle: HOUR_MS }
/** A working day on a phone that others hold tomorrow. */
const BY_PIN: Limits = { span: 12 * HOUR_MS, idle: 12 * HOUR_MS }

/** How exact the time is at which a session was seen last, milliseconds. */
export const SEEN_EVERY_MS = MINUTE_MS

interface SessionTimes {
  openedAt: Date
  seenAt: Date
  /** Written when it was opened. */
  endsAt: Date
  isByPin: boolean
}

/** Which limits hold. @param isShort as for an account with a second factor. */
export const limitsOf = ({ isByPin, isShort }: { isByPin: boolean; isShort: boolean }): Limits => (isByPin ? BY_PIN : isShort ? BY_FACTOR : BY_PASSWORD)

/** How long a new session lasts at most, milliseconds; what is short only for some is judged at each request. */
export const longestSpan = (isByPin: boolean): number => limitsOf({ isByPin, isShort: false }).span

/** When a session ends if it is not used again. @param isShort as for an account with a second factor. */
export function sessionEnd({ openedAt, seenAt, endsAt, isByPin }: SessionTimes, isShort: boolean): Date {
  const { span, idle } = limitsOf({ isByPin, isShort })
  return new Date(Math.min(endsAt.getTime(), openedAt.getTime() + span, seenAt.getTime() + idle))
}
