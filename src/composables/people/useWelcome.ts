import { computed, reactive, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Welcome } from '../../../shared/contract/welcome.ts'
import { ApiError } from '../../api/errors.ts'
import { welcomeApi } from '../../api/welcomeApi.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask, type Task } from '../form/useTask.ts'

/** Shortest password the server takes. */
const SHORTEST = 12

/** The one-time link: whom it is for, and what it opens. */
export function useWelcome(): {
  /** Reading whom the link is for. */
  opening: Task<[string], Welcome>
  /** True when the link is used up or was never valid. */
  gone: ComputedRef<boolean>
  /** Takes a name and a password, and signs in with them. */
  accept: (token: string, name: string, password: string) => Promise<boolean>
  /** Takes an invitation with the account that is signed in. */
  take: (token: string) => Promise<boolean>
  errors: { name: string; password: string }
  refusal: Ref<string>
} {
  const session = useSession()
  const preferences = usePreferences()
  const messages = useMessages()
  const { t } = useI18n()
  const errors = reactive({ name: '', password: '' })
  const refusal = ref('')
  const opening = useTask(async (token: string) => {
    const welcome = await welcomeApi.read(token)
    // In the language of the letter; and who has an account takes it signed in.
    if (welcome.invitation !== null) await preferences.offerLanguage(welcome.invitation.language)
    if (!welcome.needsPassword) await session.load()
    return welcome
  })
  const gone = computed(() => opening.error.value instanceof ApiError)

  async function accept(token: string, name: string, password: string): Promise<boolean> {
    errors.name = name.trim() === '' ? t('session.welcome.nameNeeded') : ''
    errors.password = password.length < SHORTEST ? t('session.welcome.passwordShort') : ''
    if (errors.name !== '' || errors.password !== '') return false
    return attempt(async () => {
      await welcomeApi.accept(token, name.trim(), password)
      await session.signIn(opening.result.value?.email ?? '', password)
    })
  }

  const take = (token: string): Promise<boolean> => attempt(async () => session.open((await welcomeApi.take(token)).farmId))

  async function attempt(work: () => Promise<void>): Promise<boolean> {
    refusal.value = ''
    try {
      await work()
      return true
    } catch (error) {
      const found = fieldErrors(error)
      errors.name = found['name'] ?? ''
      errors.password = found['password'] ?? ''
      if (errors.name === '' && errors.password === '') refusal.value = messages.problem(error)
      return false
    }
  }

  return { opening, gone, accept, take, errors, refusal }
}
