const MINUTE_MS = 60_000

/**
 * How far the device's clock ran ahead of the server's when it sent a record; below zero behind.
 * @returns whole minutes, null where the device told none.
 */
export function clockSkewMinutes(deviceAt: Date | null, receivedAt: Date): number | null {
  if (deviceAt === null) return null
  const minutes = Math.round((deviceAt.getTime() - receivedAt.getTime()) / MINUTE_MS)
  return minutes === 0 ? 0 : minutes
}
