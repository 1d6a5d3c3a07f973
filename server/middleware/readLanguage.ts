import type { Request } from 'express'
import { LANGUAGES, type Language } from '../../shared/messages/translate.ts'

/** The language the caller asks for by Accept-Language; English where it asks for none of ours. */
export function readLanguage(request: Request): Language {
  const wanted = request.acceptsLanguages([...LANGUAGES])
  return wanted === 'es' ? 'es' : 'en'
}
