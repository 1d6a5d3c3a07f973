import { computed, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import { useSession } from '../../stores/session.ts'

/** What is asked of the signer: the password, or on a phone of the farm the PIN. */
export function useSignWords(): { label: ComputedRef<string>; short: ComputedRef<string>; inputmode: ComputedRef<'text' | 'numeric'> } {
  const { t } = useI18n()
  const session = useSession()
  const isPin = computed(() => session.user?.signsWith === 'pin')
  return {
    label: computed(() => t(isPin.value ? 'pin.yours' : 'records.sign.password')),
    short: computed(() => t(isPin.value ? 'pin.short' : 'records.sign.passwordShort')),
    inputmode: computed(() => (isPin.value ? 'numeric' : 'text')),
  }
}
