import { computed, type ComputedRef, type Ref } from 'vue'
import type { ChangeMe } from '../../../shared/contract/me.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import type { UnitSystem } from '../../../shared/units/readingUnit.ts'
import { usePreferences, type Light } from '../../stores/preferences.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useLanguageChoice } from '../app/useLanguageChoice.ts'
import { useMe } from './useMe.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask } from '../form/useTask.ts'

/** What one changes on one's own page. Language and light change on this device at once, and go with the account. */
export function useProfile(): {
  errors: ComputedRef<Record<string, string>>
  refusal: ComputedRef<string>
  busy: Ref<boolean>
  /** Answers whether it is saved. */
  save: (changes: Omit<ChangeMe, 'revision'>) => Promise<boolean>
  chooseLanguage: (language: Language) => Promise<void>
  chooseLight: (light: Light) => Promise<void>
  chooseUnits: (units: UnitSystem) => Promise<void>
} {
  const preferences = usePreferences()
  const messages = useMessages()
  const choice = useLanguageChoice()
  const me = useMe()
  const task = useTask(async (changes: Omit<ChangeMe, 'revision'>) => { await me.change(changes); return true })
  const errors = computed(() => fieldErrors(task.error.value))
  const save = async (changes: Omit<ChangeMe, 'revision'>): Promise<boolean> => (await task.run(changes)) === true
  return {
    errors, save, busy: task.running,
    refusal: computed(() => (task.error.value === null || Object.keys(errors.value).length > 0 ? '' : messages.problem(task.error.value))),
    chooseLanguage: async (language) => {
      await choice.chooseLanguage(language)
      await save({ language })
    },
    chooseUnits: async (units) => { await save({ preferences: { units } }) },
    chooseLight: async (light) => {
      preferences.chooseLight(light)
      await save({ preferences: { light } })
    },
  }
}
