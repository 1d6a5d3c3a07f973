import { translate, type Language } from '../../../shared/messages/translate.ts'
import { ApiError, NetworkError } from '../../api/errors.ts'

/** What failed, in one sentence a person can act on. */
export function problemWords(language: Language, error: unknown): string {
  if (error instanceof NetworkError) return translate(language, 'common.noAnswer')
  if (!(error instanceof ApiError)) return translate(language, 'common.unexpected')
  if (error.problem.status === 429) return tooMany(language, error.retryAfterS)
  return error.problem.detail
}

function tooMany(language: Language, seconds: number | null): string {
  if (seconds === null) return translate(language, 'common.tooMany')
  const minutes = Math.ceil(seconds / 60)
  return translate(language, 'common.tooManyMinutes', { count: Math.max(1, minutes) })
}
