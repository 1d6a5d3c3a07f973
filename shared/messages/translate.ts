import { createCoreContext, registerMessageCompiler, registerMessageResolver, resolveValue, translate as coreTranslate, type CoreContext } from '@intlify/core-base'
import { compileWords } from './compileWords.ts'
import type { Messages, Screens } from './en.ts'

/** Languages the product speaks. */
export const LANGUAGES = ['en', 'es'] as const
export type Language = (typeof LANGUAGES)[number]

registerMessageCompiler(compileWords)
registerMessageResolver(resolveValue)

const contexts = new Map<Language, CoreContext<string, object, object, object>>()

/** Gives `translate` the words of a language; it has none of its own, so that a screen reads the one it shows. */
export function teachWords(language: Language, words: Messages | Screens): void {
  contexts.set(language, createCoreContext({
    locale: language, messages: { [language]: words }, missingWarn: false, fallbackWarn: false,
  }))
}

/**
 * The words of one message, for mail, PDF and problems (screens use vue-i18n over the same messages).
 * @throws {RangeError} if there is no message of that id, so that a missing one cannot reach a reader, or if the language was not taught.
 */
export function translate(language: Language, id: string, params: Record<string, string | number> = {}, plural?: number): string {
  const context = contexts.get(language)
  if (context === undefined) throw new RangeError(`No words of "${language}" yet`)
  const words = plural === undefined ? coreTranslate(context, id, params) : coreTranslate(context, id, params, plural)
  if (typeof words !== 'string' || words === id) throw new RangeError(`No message "${id}"`)
  return words
}
