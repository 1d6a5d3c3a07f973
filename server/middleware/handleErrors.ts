import type { ErrorRequestHandler } from 'express'
import { AppError } from '../errors.ts'
import type { Services } from '../services/services.ts'
import { countGuess } from './limitPasswords.ts'
import { logSecurity, securityEventOf } from './logSecurity.ts'
import { presentProblem, presentUnforeseen } from './presentProblem.ts'
import { readLanguage } from './readLanguage.ts'

/** Seconds until what is full or out of reach is worth another try. */
const TRY_AGAIN_S = '60'

/** Every refusal and fault leaves here as problem JSON; what nobody foresaw is logged once, with its stack. */
export function handleErrors(services: Services): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    // Whoever closes a page while a report is still being sent breaks it off; nobody has to act.
    if (isBrokenOff(error)) return
    if (response.headersSent) {
      services.logger.error({ err: error, requestId: request.id }, 'answer broke off')
      next(error)
      return
    }
    if (error instanceof AppError) {
      if (error.countsAsGuess) countGuess(response, error.code)
      const event = securityEventOf(error)
      if (event !== null) logSecurity(services, request, event, { code: error.code })
    }
    const language = readLanguage(request)
    const requestId = String(request.id)
    const problem = presentProblem(error, language, requestId)
    if (!problem) services.logger.error({ err: error, requestId }, 'unforeseen')
    if (problem?.status === 503) response.set('Retry-After', TRY_AGAIN_S)
    const answer = problem ?? presentUnforeseen(language, requestId)
    response.status(answer.status).type('application/problem+json').send(JSON.stringify(answer))
  }
}

function isBrokenOff(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE'
}
