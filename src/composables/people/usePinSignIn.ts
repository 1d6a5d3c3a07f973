import { onMounted, ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { PhoneHere } from '../../../shared/contract/sharedPhone.ts'
import { ApiError } from '../../api/errors.ts'
import { phoneApi } from '../../api/phoneApi.ts'
import { useSession } from '../../stores/session.ts'
import { useMessages } from '../app/useMessages.ts'

const PIN = /^\d{6}$/

/** Signing in by PIN where this is a phone of the farm. */
export interface PinSignIn {
  /** Null until it is known, and on a phone that is no farm's. */
  phone: ShallowRef<PhoneHere['phone']>
  busy: Ref<boolean>
  refusal: Ref<string>
  error: Ref<string>
  forget: () => void
  /** Answers whether the person is signed in. */
  signIn: (personId: string, pin: string) => Promise<boolean>
}

/** @param asks whether to ask whose phone this is, when the page is there. */
export function usePinSignIn(asks = true): PinSignIn {
  const { t } = useI18n()
  const session = useSession()
  const messages = useMessages()
  const phone = shallowRef<PhoneHere['phone']>(null)
  const busy = ref(false)
  const refusal = ref('')
  const error = ref('')

  function forget(): void {
    refusal.value = ''
    error.value = ''
  }

  async function signIn(personId: string, pin: string): Promise<boolean> {
    forget()
    if (!PIN.test(pin)) error.value = t('pin.pinNeeded')
    if (error.value !== '' || busy.value) return false
    busy.value = true
    try {
      await session.signInByPin(personId, pin)
      return true
    } catch (cause) {
      refusal.value = cause instanceof ApiError && cause.problem.code === 'pin.wrong' ? t('pin.wrong') : messages.problem(cause)
      return false
    } finally {
      busy.value = false
    }
  }

  // Without signal nobody signs in anyway.
  onMounted(async () => { if (asks) phone.value = await phoneApi.here().catch(() => null) })
  return { phone, busy, refusal, error, forget, signIn }
}
