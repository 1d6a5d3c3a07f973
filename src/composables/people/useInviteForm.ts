import { computed, reactive, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { createInvitationSchema, type INVITED_ROLES } from '../../../shared/contract/invitation.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { newId } from '../form/newId.ts'
import { useDialogSend } from '../form/useDialogSend.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'

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
  const { t } = useI18n()
  const preferences = usePreferences()
  const schemaErrors = useSchemaErrors()
  const draft = reactive<InviteForm['draft']>({ email: '', name: '', role: 'applicator', language: 'en', password: '' })
  const { begin: beginSend, send, ...state } = useDialogSend()
  const asksPassword = computed(() => draft.role !== 'applicator')
  let id = newId()

  function begin(): void {
    id = newId()
    Object.assign(draft, { email: '', name: '', role: 'applicator', language: preferences.language, password: '' })
    beginSend()
  }

  function lacking(): Record<string, string> {
    return {
      ...(draft.email.trim() === '' && { email: t('letters.invite.emailNeeded') }),
      ...(asksPassword.value && draft.password === '' && { password: t('letters.invite.passwordNeeded') }),
    }
  }

  function save(): Promise<'sent' | 'kept' | null> {
    const { email, name, role, language, password } = draft
    const body = { id, email, name: name.trim() || null, role: role ?? 'applicator', language: language ?? 'en', ...(asksPassword.value && { password }) }
    return send({ ...schemaErrors(createInvitationSchema, body), ...lacking() }, { kind: 'invitation.create', farmId: farmId(), id, body })
  }

  return { draft, ...state, asksPassword, begin, save }
}
