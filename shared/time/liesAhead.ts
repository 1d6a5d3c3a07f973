/** Clocks differ by some minutes: so much may a written time lie ahead of ours, milliseconds. */
const TOLERANCE_MS = 10 * 60_000

/** Whether an instant is still to come, so that nothing can have been done then. @param instant RFC 3339 with its offset. */
export const liesAhead = (instant: string, now: Date): boolean => Date.parse(instant) > now.getTime() + TOLERANCE_MS
