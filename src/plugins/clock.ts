/** The device's clock: the only place of the client that reads it. */
export function now(): Date {
  return new Date()
}
