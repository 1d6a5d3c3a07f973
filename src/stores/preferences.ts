import { defineStore } from 'pinia'
import { ref, watch } from 'vue'
import type { Language } from '../../shared/messages/translate.ts'
import { i18n } from '../plugins/i18n.ts'
import { readSetting, writeSetting } from './settings.ts'

/** Day, or dark for the cab before sunrise. */
export type Light = 'day' | 'dawn'

/** What a person chose for this device: language and light. */
export const usePreferences = defineStore('preferences', () => {
  const language = ref<Language>(readSetting('language', ['en', 'es']) ?? languageOfDevice())
  const light = ref<Light>(readSetting('light', ['day', 'dawn']) ?? 'day')

  watch(language, (value) => {
    writeSetting('language', value)
    i18n.global.locale.value = value
    document.documentElement.lang = value
  }, { immediate: true })

  watch(light, (value) => {
    writeSetting('light', value)
    document.documentElement.dataset['light'] = value
  }, { immediate: true })

  /** The account's own language, unless this device has been told another. */
  function offerLanguage(value: Language): void {
    if (readSetting('language.chosen', ['yes']) === null) language.value = value
  }

  function chooseLanguage(value: Language): void {
    writeSetting('language.chosen', 'yes')
    language.value = value
  }

  return { language, light, offerLanguage, chooseLanguage }
})

function languageOfDevice(): Language {
  return navigator.language.toLowerCase().startsWith('es') ? 'es' : 'en'
}
