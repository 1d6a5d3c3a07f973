/** Where the time comes from; injected everywhere, so that tests and pictures can hold it still. */
export interface Clock {
  now(): Date
}

export const systemClock: Clock = { now: () => new Date(Date.now()) }

/** A clock that stands still. @param instant RFC 3339. @throws {RangeError} if it is no instant. */
export function fixedClock(instant: string): Clock {
  const at = Date.parse(instant)
  if (Number.isNaN(at)) throw new RangeError(`Not an instant: ${instant}`)
  return { now: () => new Date(at) }
}
