import type { Response } from 'express'
import { deviceCookieName, markDevice } from '../services/knownDevice.ts'
import type { Services } from '../services/services.ts'

const YEAR_MS = 365 * 86_400_000

/** Marks the browser that asks as one that an account is at home on; the mark opens nothing. */
export function rememberDevice({ config }: Pick<Services, 'config'>, response: Response, email: string): void {
  response.cookie(deviceCookieName(config, email), markDevice(config.sessionSecret, email), {
    httpOnly: true, sameSite: 'lax', secure: config.cookies.secure, maxAge: YEAR_MS, path: '/api/session',
  })
}
