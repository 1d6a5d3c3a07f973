import { reactive, ref, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { createFarmSchema } from '../../../shared/contract/farm.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'

export interface FarmDraft {
  name: string
  /** IANA zone; the device's own to begin with. */
  zone: string
  /** MM-DD. */
  seasonStart: string
}

/** Making a farm; its maker becomes the owner. One id for the whole form, so that a second tap makes no second farm. */
export function useFarmForm(): {
  draft: FarmDraft
  errors: Ref<Record<string, string>>
  refusal: Ref<string>
  busy: Ref<boolean>
  /** True once the farm is made and open. */
  save: () => Promise<boolean>
} {
  const { t } = useI18n()
  const session = useSession()
  const { submit } = useSubmit()
  const messages = useMessages()
  const bodyErrors = useSchemaErrors()
  const id = newId()
  const draft = reactive<FarmDraft>({ name: '', zone: Intl.DateTimeFormat().resolvedOptions().timeZone, seasonStart: '01-01' })
  const errors = ref<Record<string, string>>({})
  const refusal = ref('')
  const busy = ref(false)

  async function save(): Promise<boolean> {
    if (busy.value) return false
    const body = { id, ...draft }
    errors.value = bodyErrors(createFarmSchema, body)
    refusal.value = ''
    if (Object.keys(errors.value).length > 0) return false
    busy.value = true
    try {
      const { state } = await submit({ kind: 'farm.create', farmId: id, id, body })
      if (state === 'kept') refusal.value = t('common.noAnswer')
      else await session.open(id)
      return state === 'sent'
    } catch (error) {
      errors.value = fieldErrors(error)
      if (Object.keys(errors.value).length === 0) refusal.value = messages.problem(error)
      return false
    } finally {
      busy.value = false
    }
  }

  return { draft, errors, refusal, busy, save }
}
