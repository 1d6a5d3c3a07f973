import { compile, createCoreContext, registerMessageCompiler, registerMessageResolver, resolveValue, translate as coreTranslate } from '@intlify/core-base'
import { en } from './en.ts'
import { es } from './es.ts'

/** Languages the product speaks. */
export const LANGUAGES = ['en', 'es'] as const
export type Language = (typeof LANGUAGES)[number]

registerMessageCompiler(compile)
registerMessageResolver(resolveValue)

const common = { missingWarn: false, fallbackWarn: false }
const contexts = {
  en: createCoreContext({ ...common, locale: 'en', messages: { en } }),
  es: createCoreContext({ ...common, locale: 'es', messages: { es } }),
}

/**
 * The words of one message, for mail, PDF and problems (screens use vue-i18n over the same messages).
 * @throws {RangeError} if there is no message of that id, so that a missing one cannot reach a reader.
 */
export function translate(language: Language, id: string, params: Record<string, string | number> = {}): string {
  const words = coreTranslate(contexts[language], id, params)
  if (typeof words !== 'string' || words === id) throw new RangeError(`No message "${id}"`)
  return words
}
