import type { Request, RequestHandler, Response } from 'express'
import { RateLimiterMemory } from 'rate-limiter-flexible'
import { AppError } from '../errors.ts'
import { findKnownDevice } from '../services/knownDevice.ts'
import { readPhoneMark } from '../services/phones/phoneCookie.ts'
import type { Services } from '../services/services.ts'

const WINDOW_S = 15 * 60
const PER_ACCOUNT_AND_ADDRESS = 5
const PER_ADDRESS = 20
/** Signing asks the password of a live session; whoever holds it in wet gloves mistypes. */
const PER_SESSION = 10
/** Wrong PINs of one person on one shared phone, and of all on it. */
const PER_PIN = 5
const PER_PHONE = 20
/** Wrong codes of a second factor, from wherever: who tries them has the password. */
const PER_FACTOR = 20

/** A limiter and the key that this request is counted under. */
interface Count {
  limiter: RateLimiterMemory
  key: string
  /** The refusal that is counted; any wrong secret where none is named. */
  only?: string
}

/**
 * Guards what a password or a one-time secret is tried at. Only wrong ones count, after they were judged. Signing in is
 * counted by address and by account and address together: who guesses at a worker's account from elsewhere does not shut
 * the worker out, and a device that has signed that account in before is counted on its own. Signing a record is counted by
 * session alone, a PIN by person and shared phone: one phone locks nobody out of another.
 */
export function limitPasswords(services: Services): RequestHandler {
  const limiter = (points: number) => new RateLimiterMemory({ points, duration: WINDOW_S })
  const byAddress = limiter(PER_ADDRESS)
  const byAccount = limiter(PER_ACCOUNT_AND_ADDRESS)
  const bySession = limiter(PER_SESSION)
  const byPin = limiter(PER_PIN)
  const byPhone = limiter(PER_PHONE)
  const byFactor = limiter(PER_FACTOR)

  function countsOf(request: Request): Count[] {
    if (request.user && emailOf(request) === '') return [{ limiter: bySession, key: `${request.user.accountId} ${request.sessionID}` }]
    const pin = pinTriedIn(services, request)
    if (pin !== null) return [{ limiter: byPhone, key: pin.phone }, { limiter: byPin, key: `${pin.phone} ${pin.person}` }]
    const email = emailOf(request)
    const address = request.ip ?? 'unknown'
    const device = findKnownDevice(services.config, request.get('Cookie'), email)
    if (device !== null) return [{ limiter: byAccount, key: `device ${device}` }]
    return [
      { limiter: byAddress, key: address }, { limiter: byAccount, key: `${email} ${address}` }, { limiter: byFactor, key: email, only: 'session.code_wrong' },
    ]
  }

  return async (request, response, next) => {
    const counts = countsOf(request)
    for (const { limiter: each, key } of counts) {
      const state = await each.get(key)
      if (state !== null && state.consumedPoints >= each.points) return next(tooMany(response, state.msBeforeNext))
    }
    response.locals[COUNT_GUESS] = (code: string) => {
      for (const { limiter: each, key, only } of counts) if (only === undefined || only === code) void each.penalty(key)
    }
    next()
  }
}

const COUNT_GUESS = 'countGuess'

/** Counts the wrong answer that is being sent, where one was guarded. @param code of the refusal. */
export function countGuess(response: Response, code: string): void {
  const count: unknown = response.locals[COUNT_GUESS]
  if (typeof count === 'function') count(code)
}

/** Whose PIN is tried on which phone; null where none is. A phone that lies about itself is refused before anything is counted. */
function pinTriedIn({ config }: Services, request: Request): { phone: string; person: string } | null {
  const body: unknown = request.body
  const person = typeof body === 'object' && body !== null && 'personId' in body ? body.personId : undefined
  const mark = readPhoneMark(config.cookies.phoneName, request.get('Cookie'))
  return mark !== null && typeof person === 'string' ? { phone: `${mark.farmId} ${mark.phoneId}`, person: person.slice(0, 40) } : null
}

function tooMany(response: Response, msBeforeNext: number): AppError {
  const seconds = Math.ceil(msBeforeNext / 1000)
  response.set('Retry-After', String(seconds))
  return new AppError('too-many', 'too_many', { errors: [{ path: 'password', code: 'too_many', params: { minutes: Math.ceil(seconds / 60) } }] })
}

/** The e-mail that was typed; empty where the body names none, as with a one-time link. */
export function emailOf(request: Request): string {
  const body: unknown = request.body
  const email = typeof body === 'object' && body !== null && 'email' in body ? body.email : undefined
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : ''
}
