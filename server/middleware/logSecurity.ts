import type { Request } from 'express'
import type { AppError } from '../errors.ts'
import { emailDigest } from '../services/emailDigest.ts'
import type { Services } from '../services/services.ts'
import { emailOf } from './limitPasswords.ts'

export type SecurityEvent = 'sign-in.ok' | 'sign-in.failed' | 'secret.wrong' | 'forbidden' | 'limited' | 'password.changed' | 'rights.changed' | 'factor.changed' | 'phone.enrolled'

const REFUSED: ReadonlySet<SecurityEvent> = new Set(['sign-in.failed', 'secret.wrong', 'forbidden', 'limited'])
const FARM = /^\/api\/farms\/([0-9a-f-]{36})/i

/**
 * One JSON line of who came in, who was kept out, and where: no secret, no body, of an e-mail its salted digest alone.
 * What was opened is `info`, what was refused `warn`.
 */
export function logSecurity(services: Pick<Services, 'config' | 'logger'>, request: Request, event: SecurityEvent, more: { accountId?: string; code?: string } = {}): void {
  const email = emailOf(request)
  const level = REFUSED.has(event) ? 'warn' : 'info'
  services.logger[level]({
    event,
    requestId: String(request.id),
    address: request.ip,
    method: request.method,
    // The pattern, never the address itself: that of a one-time link is a secret.
    route: (request.route as { path?: string } | undefined)?.path,
    farmId: FARM.exec(request.originalUrl)?.[1],
    accountId: request.user?.accountId,
    ...(email !== '' && { email: emailDigest(services.config.sessionSecret, email) }),
    ...more,
  }, 'security')
}

/** The event that a refusal is, or null where it is none. */
export function securityEventOf({ status, code, countsAsGuess }: AppError): SecurityEvent | null {
  if (countsAsGuess) return code === 'session.wrong' || code === 'pin.wrong' || code === 'session.code_wrong' ? 'sign-in.failed' : 'secret.wrong'
  if (status === 403) return 'forbidden'
  return status === 429 ? 'limited' : null
}
