import { defineStore } from 'pinia'
import { ref, watch } from 'vue'
import type { Language } from '../../shared/messages/translate.ts'
import { readLanguage, showLanguage } from '../plugins/i18n.ts'
import { readSetting, writeSetting } from './settings.ts'

/** Day, or dark for the cab before sunrise. */
export type Light = 'day' | 'dawn'

/** What a person chose for this device: language and light. */
export const usePreferences = defineStore('preferences', () => {
  const language = ref<Language>(readSetting('language', ['en', 'es']) ?? languageOfDevice())
  const light = ref<Light>(readSetting('light', ['day', 'dawn']) ?? 'day')

  watch(language, (value) => {
    writeSetting('language', value)
    showLanguage(value)
    document.documentElement.lang = value
  }, { immediate: true })

  watch(light, (value) => {
    writeSetting('light', value)
    document.documentElement.dataset['light'] = value
  }, { immediate: true })

  /** The account's own language, unless this device has been told another or cannot read it now. */
  async function offerLanguage(value: Language): Promise<void> {
    if (readSetting('language.chosen', ['yes']) !== null) return
    try {
      await takeLanguage(value)
    } catch { /* It stays as it was; the choice is in the frame. */ }
  }

  /** @throws where the words cannot be read, as without signal; the language then stays as it was. */
  async function chooseLanguage(value: Language): Promise<void> {
    await takeLanguage(value)
    writeSetting('language.chosen', 'yes')
  }

  let asked: Language = language.value
  /** Of two choices the later one stands, whichever was read first. */
  async function takeLanguage(value: Language): Promise<void> {
    asked = value
    await readLanguage(value)
    if (asked === value) language.value = value
  }

  /** Reads the words before anything is shown. */
  async function start(): Promise<void> {
    await readLanguage(language.value)
    showLanguage(language.value)
  }

  return { language, light, offerLanguage, chooseLanguage, start }
})

function languageOfDevice(): Language {
  return navigator.language.toLowerCase().startsWith('es') ? 'es' : 'en'
}
