import { createI18n } from 'vue-i18n'
import { en } from '../../shared/messages/en.ts'
import { es } from '../../shared/messages/es.ts'

/** Words of the screens: the same messages that mail, PDF and problems use. */
export const i18n = createI18n({
  legacy: false,
  locale: 'en',
  fallbackLocale: 'en',
  messages: { en, es },
})
