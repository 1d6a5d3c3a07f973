import { translate, type Language } from '../../../shared/messages/translate.ts'

/** The words a message has on the screen, so that a test finds a control by what a person reads. @throws {RangeError} for no such message. */
export function say(id: string, params: Record<string, string | number> = {}, language: Language = 'en'): string {
  return translate(language, id, params)
}

/** The words of a message with anything in the place of each param. */
export function saying(id: string, language: Language = 'en'): RegExp {
  const marked = translate(language, id, new Proxy({}, { get: (_, name) => (typeof name === 'string' ? '\u0001' : undefined), has: () => true }))
  return new RegExp(marked.split('\u0001').map((part) => part.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')).join('.+'))
}
