import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto'
import type { Config } from '../config.ts'

const DEVICE = /^[\w-]{22}$/

/** The name of the cookie that marks a device for one account; a shared phone holds one for each. */
export function deviceCookieName({ cookies, sessionSecret }: Pick<Config, 'cookies' | 'sessionSecret'>, email: string): string {
  return `${cookies.devicePrefix}${seal(sessionSecret, `name ${fold(email)}`).slice(0, 10)}`
}

/** A mark for a device that has signed an account in; it opens nothing, failures of that device only count apart. */
export function markDevice(secret: string, email: string): string {
  const device = randomBytes(16).toString('base64url')
  return `${device}.${seal(secret, `device ${device} ${fold(email)}`)}`
}

/** The device that the cookies name for this account, or null where none has signed it in before. */
export function findKnownDevice(config: Pick<Config, 'cookies' | 'sessionSecret'>, sent: string | undefined, email: string): string | null {
  const name = deviceCookieName(config, email)
  const value = sent?.split('; ').find((cookie) => cookie.startsWith(`${name}=`))?.slice(name.length + 1)
  const [device = '', given = ''] = value?.split('.') ?? []
  if (!DEVICE.test(device)) return null
  const wanted = Buffer.from(seal(config.sessionSecret, `device ${device} ${fold(email)}`))
  const found = Buffer.from(given)
  return found.length === wanted.length && timingSafeEqual(found, wanted) ? device : null
}

function seal(secret: string, text: string): string {
  return createHmac('sha256', secret).update(text).digest('base64url')
}

function fold(email: string): string {
  return email.trim().toLowerCase()
}
