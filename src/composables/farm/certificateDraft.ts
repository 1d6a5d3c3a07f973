import type { Certificate } from '../../../shared/contract/certificate.ts'
import { addDays } from '../../../shared/time/calendar.ts'
import { typedWords } from '../form/typedFigure.ts'

/** A certificate as it is typed. */
export interface CertificateDraft {
  number: string
  body: string
  scope: string
  validFrom: string | null
  validUntil: string | null
}

export function draftOfCertificate({ number, body, scope, validFrom, validUntil }: Certificate): CertificateDraft {
  return { number, body, scope: scope ?? '', validFrom, validUntil }
}

/** The next one: who certifies and what it covers goes along, and it begins when the one before ends. */
export function nextCertificate(before: Certificate | null, today: string): CertificateDraft {
  const { number = '', body = '', scope = null, validUntil = null } = before ?? {}
  return { number, body, scope: scope ?? '', validFrom: validUntil === null ? today : addDays(validUntil, 1), validUntil: null }
}

/** The form as it is sent; the contract judges it. */
export function bodyOfCertificate({ number, body, scope, validFrom, validUntil }: CertificateDraft): object {
  return { number, body, scope: typedWords(scope), validFrom: validFrom ?? '', validUntil }
}
