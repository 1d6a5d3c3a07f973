import { reactive, ref, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { ApiError, NetworkError } from '../../api/errors.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSignalBack } from '../app/useSignalBack.ts'

/** Signing in from a form: what is missing at its fields, what was refused above them. */
export interface SignIn {
  errors: { email: string; password: string; code: string }
  /** The password was right, and the account has a second factor. */
  asksCode: Ref<boolean>
  refusal: Ref<string>
  busy: Ref<boolean>
  /** Answers whether the person is signed in. */
  signIn: (email: string, password: string, code?: string) => Promise<boolean>
}

/** @param wrongWords what to say when e-mail and password do not match. */
export function useSignIn(wrongWords: () => string): SignIn {
  const session = useSession()
  const preferences = usePreferences()
  const messages = useMessages()
  const { t } = useI18n()
  const errors = reactive({ email: '', password: '', code: '' })
  const asksCode = ref(false)
  const refusal = ref('')
  const busy = ref(false)
  let lacksSignal = false

  async function signIn(email: string, password: string, code = ''): Promise<boolean> {
    errors.email = email.trim() === '' ? t('session.emailNeeded') : ''
    errors.password = password === '' ? t('session.passwordNeeded') : ''
    errors.code = asksCode.value && code.trim() === '' ? t('pin.codeNeeded') : ''
    refusal.value = ''
    lacksSignal = false
    if (Object.values(errors).some((words) => words !== '') || busy.value) return false
    busy.value = true
    try {
      await session.signIn(email.trim(), password, asksCode.value ? code : undefined)
      if (session.user !== null) await preferences.offerLanguage(session.user.language)
      preferences.offerLight(session.user?.preferences.light)
      return true
    } catch (error) {
      lacksSignal = error instanceof NetworkError
      if (error instanceof ApiError && error.problem.code === 'session.code_needed') {
        asksCode.value = true
        return false
      }
      refusal.value = isWrong(error) ? wrongWords() : messages.problem(error)
      return false
    } finally {
      busy.value = false
    }
  }

  useSignalBack(() => { if (lacksSignal) refusal.value = '' })
  return { errors, asksCode, refusal, busy, signIn }
}

function isWrong(error: unknown): boolean {
  return error instanceof ApiError && error.problem.code !== 'session.code_wrong' && [401, 422].includes(error.problem.status)
}
