import type { Message } from '../shared/contract/common.ts'

export interface FieldError {
  path: string
  code: string
  params?: Record<string, string | number>
  /** A message that stands inside this one, as its `{about}`. */
  about?: Message
}

const STATUSES = {
  'bad-request': 400,
  unauthenticated: 401,
  forbidden: 403,
  'not-found': 404,
  'wrong-method': 405,
  conflict: 409,
  'too-large': 413,
  'wrong-type': 415,
  'invalid-input': 422,
  'too-many': 429,
  unavailable: 503,
} as const

/** What kind of refusal it is; decides the status. */
export type Refusal = keyof typeof STATUSES

/**
 * A refusal that the caller can act on. `code` names the message in `problems`, `errors` the fields,
 * `acknowledgeable` that it is unlikely, not impossible, `current` the other side of a stale write,
 * `countsAsGuess` that a secret was tried in vain.
 */
export class AppError extends Error {
  readonly status: number
  readonly refusal: Refusal
  readonly code: string
  readonly errors: FieldError[]
  readonly acknowledgeable: boolean
  readonly current: unknown
  /** A password or a one-time secret was tried and did not fit. */
  readonly countsAsGuess: boolean

  constructor(
    refusal: Refusal,
    code: string,
    more: { errors?: FieldError[]; acknowledgeable?: boolean; current?: unknown; countsAsGuess?: boolean } = {},
  ) {
    super(code)
    this.status = STATUSES[refusal]
    this.refusal = refusal
    this.code = code
    this.errors = more.errors ?? []
    this.acknowledgeable = more.acknowledgeable ?? false
    this.current = more.current
    this.countsAsGuess = more.countsAsGuess ?? false
  }
}

export const notFound = () => new AppError('not-found', 'not_found')
export const forbidden = (code = 'forbidden') => new AppError('forbidden', code)
export const invalid = (errors: FieldError[]) => new AppError('invalid-input', 'invalid', { errors })
export const unlikely = (errors: FieldError[]) =>
  new AppError('invalid-input', 'unlikely', { errors, acknowledgeable: true })
export const stale = (current: unknown) => new AppError('conflict', 'stale', { current })
