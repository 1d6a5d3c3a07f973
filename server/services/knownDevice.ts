import { createHmac, timingSafeEqual } from 'node:crypto'

export const DEVICE_COOKIE = 'drenchleaf.device'

/** The mark left on a device that has signed an account in; it opens nothing, it only counts failures apart. */
export function markDevice(secret: string, email: string): string {
  return createHmac('sha256', secret).update(`device ${email.trim().toLowerCase()}`).digest('base64url')
}

/** Whether the cookies hold the mark for this account. */
export function isKnownDevice(secret: string, cookies: string | undefined, email: string): boolean {
  const found = cookies?.split('; ').find((cookie) => cookie.startsWith(`${DEVICE_COOKIE}=`))
  if (!found) return false
  const given = Buffer.from(found.slice(DEVICE_COOKIE.length + 1))
  const wanted = Buffer.from(markDevice(secret, email))
  return given.length === wanted.length && timingSafeEqual(given, wanted)
}
