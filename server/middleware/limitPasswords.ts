import { ipKeyGenerator, rateLimit, type Options } from 'express-rate-limit'
import type { Request, RequestHandler } from 'express'
import { AppError } from '../errors.ts'
import type { Services } from '../services/services.ts'
import { isKnownDevice } from '../services/knownDevice.ts'

/** Set on an answer that refused a password; other refusals are no guess. */
export const WRONG_PASSWORD = 'wrongPassword'

const WINDOW_MS = 15 * 60_000
const PER_ACCOUNT_AND_ADDRESS = 5
const PER_ADDRESS = 20

/**
 * Failed passwords are counted by account and address together, and by address: who guesses at a worker's account
 * from elsewhere does not shut the worker out, and a device that has signed that account in before counts alone.
 */
export function limitPasswords(services: Services): RequestHandler[] {
  const common: Partial<Options> = {
    windowMs: WINDOW_MS,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => response.locals[WRONG_PASSWORD] !== true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_request, response) => {
      const seconds = Number(response.get('Retry-After') ?? WINDOW_MS / 1000)
      throw new AppError('too-many', 'too_many', { errors: [{ path: 'password', code: 'too_many', params: { minutes: Math.ceil(seconds / 60) } }] })
    },
  }
  const known = (request: Request) => isKnownDevice(services.config.sessionSecret, request.get('Cookie'), nameOf(request))
  return [
    rateLimit({
      ...common,
      limit: PER_ACCOUNT_AND_ADDRESS,
      keyGenerator: (request) => `${nameOf(request)} ${known(request) ? 'known device' : addressOf(request)}`,
    }),
    rateLimit({ ...common, limit: PER_ADDRESS, keyGenerator: addressOf, skip: known }),
  ]
}

function addressOf(request: Request): string {
  return ipKeyGenerator(request.ip ?? 'unknown')
}

/** The account a password is tried for: the e-mail typed, or the one signed in. */
function nameOf(request: Request): string {
  const body: unknown = request.body
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : undefined
  return request.user?.accountId ?? (typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : '')
}
