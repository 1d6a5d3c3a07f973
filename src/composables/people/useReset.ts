import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { ApiError } from '../../api/errors.ts'
import { resetApi } from '../../api/resetApi.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask, type Task } from '../form/useTask.ts'

/** Shortest password the server takes. */
const SHORTEST = 12

/** A forgotten password: asking for the letter, reading whose link it is, spending it. */
export function useReset(): {
  opening: Task<[token: string], { email: string }>
  /** True when the link is used up or was never valid. */
  gone: ComputedRef<boolean>
  ask: (email: string) => Promise<boolean>
  spend: (token: string, password: string) => Promise<boolean>
  /** Of the one field there is. */
  error: Ref<string>
  refusal: Ref<string>
  busy: Ref<boolean>
} {
  const session = useSession()
  const messages = useMessages()
  const { t } = useI18n()
  const error = ref('')
  const refusal = ref('')
  const busy = ref(false)
  const opening = useTask((token: string) => resetApi.read(token))
  const gone = computed(() => opening.error.value instanceof ApiError)

  async function attempt(missing: string, field: string, work: () => Promise<unknown>): Promise<boolean> {
    error.value = missing
    refusal.value = ''
    if (missing !== '' || busy.value) return false
    busy.value = true
    try {
      await work()
      return true
    } catch (fault) {
      error.value = fieldErrors(fault)[field] ?? ''
      if (error.value === '') refusal.value = messages.problem(fault)
      return false
    } finally {
      busy.value = false
    }
  }

  return {
    opening, gone, error, refusal, busy,
    ask: (email) => attempt(email.trim() === '' ? t('session.emailNeeded') : '', 'email', () => resetApi.ask(email.trim())),
    spend: (token, password) => attempt(password.length < SHORTEST ? t('session.welcome.passwordShort') : '', 'password', async () => {
      await resetApi.spend(token, password)
      // Its sessions have ended on the server, this one too.
      if (session.user !== null) await session.forget()
    }),
  }
}
