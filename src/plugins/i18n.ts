import { registerMessageCompiler } from '@intlify/core-base'
import type { Language as ControlWords } from 'element-plus/es/locale'
import { shallowRef } from 'vue'
import { createI18n } from 'vue-i18n'
import { compileWords } from '../../shared/messages/compileWords.ts'
import type { FirstScreens, LaterScreens, Screens } from '../../shared/messages/en.ts'
import { teachWords, type Language } from '../../shared/messages/translate.ts'

interface LaterWords { later: LaterScreens; controls: ControlWords }

/** Each language is read when it is first asked for: what the way to a new record needs at once; what other screens and the controls say, with the first of them. */
const READ: Record<Language, { first: () => Promise<{ first: FirstScreens }>; later: () => Promise<LaterWords> }> = {
  en: { first: () => import('../../shared/messages/en/first.ts'), later: () => import('./laterWordsEn.ts') },
  es: { first: () => import('../../shared/messages/es/first.ts'), later: () => import('./laterWordsEs.ts') },
}

// After vue-i18n has registered its own.
registerMessageCompiler(compileWords)

/** Words of the screens: the same messages that mail, PDF and problems use. */
export const i18n = createI18n<[Screens], Language, false>({ legacy: false, locale: 'en' })

/** What the controls say of themselves in the language shown. */
export const controlWords = shallowRef<ControlWords>()

const known = new Set<Language>()
/** Languages of which everything was read, with the words of the controls. */
const whole = new Map<Language, ControlWords>()
let areLaterWanted = false

/** Has the words of a language at hand, all of them once a screen has asked for all. @throws where they cannot be read, as without signal. */
export async function readLanguage(language: Language): Promise<void> {
  if (!known.has(language)) {
    learn(language, (await READ[language].first()).first)
    known.add(language)
  }
  if (!areLaterWanted || whole.has(language)) return
  const { later, controls } = await READ[language].later()
  learn(language, later)
  whole.set(language, controls)
  if (i18n.global.locale.value === language) controlWords.value = controls
}

/** Has the words of every screen at hand, in the languages known so far and in those that come. @throws where they cannot be read. */
export async function readLaterWords(): Promise<void> {
  areLaterWanted = true
  await Promise.all([...known].map(readLanguage))
}

function learn(language: Language, words: FirstScreens | LaterScreens): void {
  i18n.global.mergeLocaleMessage(language, words)
  teachWords(language, i18n.global.getLocaleMessage(language))
}

/** Shows a language that was read. */
export function showLanguage(language: Language): void {
  i18n.global.locale.value = language
  controlWords.value = whole.get(language)
}
