import { computed, reactive, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { createInvitationSchema, type INVITED_ROLES } from '../../shared/contract/invitation.ts'
import type { Language } from '../../shared/messages/translate.ts'
import { usePreferences } from '../stores/preferences.ts'
import { fieldErrors } from './fieldErrors.ts'
import { newId } from './newId.ts'
import { useMessages } from './useMessages.ts'
import { useSchemaErrors } from './useSchemaErrors.ts'
import { useSubmit } from './useSubmit.ts'

export type InvitedRole = (typeof INVITED_ROLES)[number]

/** The form of an invitation. */
export interface InviteForm {
  draft: { email: string; name: string; role: InvitedRole | null; language: Language | null; password: string }
  errors: Record<string, string>
  refusal: Ref<string>
  busy: Ref<boolean>
  /** The role leads the farm: the inviter's password is asked. */
  asksPassword: ComputedRef<boolean>
  /** An empty form, with an id that every try of it keeps. */
  begin: () => void
  save: () => Promise<'sent' | 'kept' | null>
}

/** Checks with the contract's own schema, then submits; errors stand at their fields. */
export function useInviteForm(farmId: () => string): InviteForm {
  const { submit } = useSubmit()
  const { t } = useI18n()
  const messages = useMessages()
  const preferences = usePreferences()
  const schemaErrors = useSchemaErrors()
  const draft = reactive<InviteForm['draft']>({ email: '', name: '', role: 'applicator', language: 'en', password: '' })
  const errors = reactive<Record<string, string>>({})
  const refusal = ref('')
  const busy = ref(false)
  const asksPassword = computed(() => draft.role !== 'applicator')
  let id = newId()

  function show(found: Record<string, string>): void {
    for (const path of Object.keys(errors)) errors[path] = ''
    Object.assign(errors, found)
  }

  function begin(): void {
    id = newId()
    Object.assign(draft, { email: '', name: '', role: 'applicator', language: preferences.language, password: '' })
    refusal.value = ''
    show({})
  }

  function lacking(): Record<string, string> {
    return {
      ...(draft.email.trim() === '' && { email: t('letters.invite.emailNeeded') }),
      ...(asksPassword.value && draft.password === '' && { password: t('letters.invite.passwordNeeded') }),
    }
  }

  async function save(): Promise<'sent' | 'kept' | null> {
    if (busy.value) return null
    const { email, name, role, language, password } = draft
    const body = { id, email, name: name.trim() || null, role: role ?? 'applicator', language: language ?? 'en', ...(asksPassword.value && { password }) }
    const found = { ...schemaErrors(createInvitationSchema, body), ...lacking() }
    refusal.value = ''
    show(found)
    if (Object.keys(found).length > 0) return null
    busy.value = true
    try {
      return (await submit({ kind: 'invitation.create', farmId: farmId(), id, body })).state
    } catch (error) {
      show(fieldErrors(error))
      if (Object.keys(fieldErrors(error)).length === 0) refusal.value = messages.problem(error)
      return null
    } finally {
      busy.value = false
    }
  }

  return { draft, errors, refusal, busy, asksPassword, begin, save }
}
