import type { ZodError } from 'zod'
import type { Problem } from '../../shared/contract/problem.ts'
import { renderMessage } from '../../shared/messages/renderMessage.ts'
import { translate, type Language } from '../../shared/messages/translate.ts'
import { AppError, type FieldError } from '../errors.ts'
import { findFieldErrors } from './findFieldErrors.ts'

const MOST_ERRORS = 20

/** What a parser of the framework reports about a request it could not read. */
interface HttpFault {
  status: number
  type?: string
}

/**
 * The problem (RFC 9457) for anything thrown, in words of the caller's language.
 * @returns null for what nobody foresaw: that is logged and answered as `internal`.
 */
export function presentProblem(error: unknown, language: Language, requestId: string): Problem | null {
  if (error instanceof AppError) return presentRefusal(error, language, requestId)
  if (isZodError(error)) {
    return presentRefusal(new AppError('invalid-input', 'invalid', { errors: findFieldErrors(error) }), language, requestId)
  }
  if (isHttpFault(error)) return presentRefusal(fromHttpFault(error), language, requestId)
  return null
}

/** The answer to what nobody foresaw; its cause stays in the log. */
export function presentUnforeseen(language: Language, requestId: string): Problem {
  return {
    type: 'about:blank',
    title: translate(language, 'problems.internal'),
    status: 500,
    code: 'internal',
    detail: translate(language, 'problems.internal'),
    errors: [],
    requestId,
  }
}

/** The problem of a refusal, as it is answered or stands in an answer about several things. */
export function presentRefusal(error: AppError, language: Language, requestId: string): Problem {
  const errors = cutShort(error).map((field) => presentField(field, language))
  const title = translate(language, `problems.${error.code}`)
  return {
    type: 'about:blank',
    title,
    status: error.status,
    code: error.code,
    detail: errors.length > 0 ? errors.map((field) => field.message).join(' ') : title,
    errors,
    ...(error.acknowledgeable && { acknowledgeable: true }),
    ...(error.current !== undefined && { current: error.current }),
    requestId,
  }
}

/** The first faults and how many more there are: nobody reads a thousand. Doubts stand whole, each is answered by its code. */
function cutShort({ errors, acknowledgeable }: AppError): FieldError[] {
  if (acknowledgeable || errors.length <= MOST_ERRORS) return errors
  return [...errors.slice(0, MOST_ERRORS), { path: '', code: 'more', params: { count: errors.length - MOST_ERRORS } }]
}

function presentField({ path, code, params, about }: FieldError, language: Language): Problem['errors'][number] {
  const inner = about && { about: renderMessage(language, about) }
  return { path, code, message: renderMessage(language, { id: `problems.${code}`, params: { ...params, ...inner } }), ...(params && { params }) }
}

function isZodError(error: unknown): error is ZodError {
  return error instanceof Error && error.name === 'ZodError' && 'issues' in error
}

function isHttpFault(error: unknown): error is HttpFault {
  return error instanceof Error && 'status' in error && typeof error.status === 'number' && error.status < 500
}

function fromHttpFault(fault: HttpFault): AppError {
  if (fault.status === 404) return new AppError('not-found', 'not_found')
  if (fault.status === 413) return new AppError('too-large', 'too_large')
  if (fault.status === 415) return new AppError('wrong-type', 'wrong_type')
  return new AppError('bad-request', 'unreadable')
}
