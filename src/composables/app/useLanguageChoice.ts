import { useI18n } from 'vue-i18n'
import type { Language } from '../../../shared/messages/translate.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useToast } from './useToast.ts'

/** The language a person picks; without signal, one that was not read yet stays out, and the screen says so. */
export function useLanguageChoice(): { chooseLanguage: (language: Language) => Promise<void> } {
  const { t } = useI18n()
  const toast = useToast()
  const preferences = usePreferences()
  return {
    chooseLanguage: (language) => preferences.chooseLanguage(language).catch(() => { toast.failed(t('common.noAnswer')) }),
  }
}
