import { registerMessageCompiler } from '@intlify/core-base'
import type { Language as ControlWords } from 'element-plus/es/locale'
import { shallowRef } from 'vue'
import { createI18n } from 'vue-i18n'
import { compileWords } from '../../shared/messages/compileWords.ts'
import type { Screens } from '../../shared/messages/en.ts'
import { teachWords, type Language } from '../../shared/messages/translate.ts'

interface Words { screens: Screens; controls: ControlWords }

/** Each language is read when it is first asked for. */
const READ: Record<Language, () => Promise<Words>> = {
  en: () => import('./wordsEn.ts'),
  es: () => import('./wordsEs.ts'),
}

// After vue-i18n has registered its own.
registerMessageCompiler(compileWords)

/** Words of the screens: the same messages that mail, PDF and problems use. */
export const i18n = createI18n<[Screens], Language, false>({ legacy: false, locale: 'en' })

/** What the controls say of themselves in the language shown. */
export const controlWords = shallowRef<ControlWords>()

const known = new Map<Language, ControlWords>()

/** Has the words of a language at hand. @throws where they cannot be read, as without signal. */
export async function readLanguage(language: Language): Promise<void> {
  if (known.has(language)) return
  const { screens, controls } = await READ[language]()
  teachWords(language, screens)
  i18n.global.setLocaleMessage(language, screens)
  known.set(language, controls)
}

/** Shows a language that was read. */
export function showLanguage(language: Language): void {
  i18n.global.locale.value = language
  controlWords.value = known.get(language)
}
