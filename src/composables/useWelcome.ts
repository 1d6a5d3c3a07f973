import { computed, reactive, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { ApiError } from '../api/errors.ts'
import { welcomeApi } from '../api/welcomeApi.ts'
import { useSession } from '../stores/session.ts'
import { fieldErrors } from './fieldErrors.ts'
import { useMessages } from './useMessages.ts'
import { useTask, type Task } from './useTask.ts'

/** Shortest password the server takes. */
const SHORTEST = 12

/** The one-time link: whom it is for, and accepting it, which signs in. */
export function useWelcome(): {
  /** Reading whom the link is for. */
  opening: Task<[string], { email: string }>
  /** True when the link is used up or was never valid. */
  gone: ComputedRef<boolean>
  accept: (token: string, name: string, password: string) => Promise<boolean>
  errors: { name: string; password: string }
  refusal: Ref<string>
} {
  const session = useSession()
  const messages = useMessages()
  const { t } = useI18n()
  const errors = reactive({ name: '', password: '' })
  const refusal = ref('')
  const opening = useTask((token: string) => welcomeApi.read(token))
  const gone = computed(() => opening.error.value instanceof ApiError)

  async function accept(token: string, name: string, password: string): Promise<boolean> {
    errors.name = name.trim() === '' ? t('session.welcome.nameNeeded') : ''
    errors.password = password.length < SHORTEST ? t('session.welcome.passwordShort') : ''
    refusal.value = ''
    if (errors.name !== '' || errors.password !== '') return false
    try {
      session.accept(await welcomeApi.accept(token, name.trim(), password))
      return true
    } catch (error) {
      const found = fieldErrors(error)
      errors.name = found['name'] ?? ''
      errors.password = found['password'] ?? ''
      if (errors.name === '' && errors.password === '') refusal.value = messages.problem(error)
      return false
    }
  }

  return { opening, gone, accept, errors, refusal }
}
