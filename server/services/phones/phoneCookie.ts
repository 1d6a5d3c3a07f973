import { createHash, timingSafeEqual } from 'node:crypto'
import { z } from 'zod'

/** What a shared phone sends of itself. */
export interface PhoneMark { farmId: string; phoneId: string; secret: string }

const SECRET = /^[\w-]{43}$/

/** The phone that the cookies name, as it says itself; null where they name none. Its secret is not judged here. */
export function readPhoneMark(cookieName: string, sent: string | undefined): PhoneMark | null {
  const value = sent?.split('; ').find((cookie) => cookie.startsWith(`${cookieName}=`))?.slice(cookieName.length + 1)
  const [farmId = '', phoneId = '', secret = ''] = value?.split('.') ?? []
  const areIds = z.guid().safeParse(farmId).success && z.guid().safeParse(phoneId).success
  return areIds && SECRET.test(secret) ? { farmId, phoneId, secret } : null
}

export function writePhoneMark({ farmId, phoneId, secret }: PhoneMark): string {
  return `${farmId}.${phoneId}.${secret}`
}

export function digestOfSecret(secret: string): string {
  return createHash('sha256').update(secret).digest('hex')
}

/** Whether a secret is the one behind a digest, in the same time whatever it is. */
export function isSecretOf(digest: string, secret: string): boolean {
  return timingSafeEqual(Buffer.from(digestOfSecret(secret)), Buffer.from(digest))
}
