import type { Request, RequestHandler, Response } from 'express'
import { RateLimiterMemory } from 'rate-limiter-flexible'
import { AppError } from '../errors.ts'
import { findKnownDevice } from '../services/knownDevice.ts'
import type { Services } from '../services/services.ts'

const WINDOW_S = 15 * 60
const PER_ACCOUNT_AND_ADDRESS = 5
const PER_ADDRESS = 20
/** Signing asks the password of a live session; whoever holds it in wet gloves mistypes. */
const PER_SESSION = 10

/** A limiter and the key that this request is counted under. */
interface Count {
  limiter: RateLimiterMemory
  key: string
}

/**
 * Guards what a password or a one-time secret is tried at. Only wrong ones count, after they were judged. Signing in is
 * counted by address and by account and address together: who guesses at a worker's account from elsewhere does not shut
 * the worker out, and a device that has signed that account in before is counted on its own. Signing a record is counted by
 * session alone.
 */
export function limitPasswords(services: Services): RequestHandler {
  const limiter = (points: number) => new RateLimiterMemory({ points, duration: WINDOW_S })
  const byAddress = limiter(PER_ADDRESS)
  const byAccount = limiter(PER_ACCOUNT_AND_ADDRESS)
  const bySession = limiter(PER_SESSION)

  function countsOf(request: Request): Count[] {
    if (request.user && emailOf(request) === '') return [{ limiter: bySession, key: `${request.user.accountId} ${request.sessionID}` }]
    const email = emailOf(request)
    const address = request.ip ?? 'unknown'
    const device = findKnownDevice(services.config, request.get('Cookie'), email)
    if (device !== null) return [{ limiter: byAccount, key: `device ${device}` }]
    return [{ limiter: byAddress, key: address }, { limiter: byAccount, key: `${email} ${address}` }]
  }

  return async (request, response, next) => {
    const counts = countsOf(request)
    for (const { limiter: each, key } of counts) {
      const state = await each.get(key)
      if (state !== null && state.consumedPoints >= each.points) return next(tooMany(response, state.msBeforeNext))
    }
    response.locals[COUNT_GUESS] = () => {
      for (const { limiter: each, key } of counts) void each.penalty(key)
    }
    next()
  }
}

const COUNT_GUESS = 'countGuess'

/** Counts the wrong answer that is being sent, where one was guarded. */
export function countGuess(response: Response): void {
  const count: unknown = response.locals[COUNT_GUESS]
  if (typeof count === 'function') count()
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
