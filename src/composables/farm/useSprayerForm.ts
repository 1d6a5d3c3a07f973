import { reactive, type Ref } from 'vue'
import { createSprayerSchema } from '../../../shared/contract/farm.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'
import { newId } from '../form/newId.ts'
import { useDialogSend } from '../form/useDialogSend.ts'
import { useSchemaErrors } from '../form/useSchemaErrors.ts'

/** The form of a new sprayer. */
export interface SprayerForm {
  draft: { code: string; name: string; tankL: string }
  errors: Record<string, string>
  refusal: Ref<string>
  busy: Ref<boolean>
  /** An empty form, with an id that every try of it keeps. */
  begin: () => void
  /** Null when it was refused; the reasons then stand in `errors` and `refusal`. */
  save: () => Promise<'sent' | 'kept' | null>
}

/** Checks with the contract's own schema, then submits; errors stand at their fields. */
export function useSprayerForm(farmId: () => string): SprayerForm {
  const schemaErrors = useSchemaErrors()
  const draft = reactive({ code: '', name: '', tankL: '' })
  const { begin: beginSend, send, ...state } = useDialogSend()
  let id = newId()

  function begin(): void {
    id = newId()
    Object.assign(draft, { code: '', name: '', tankL: '' })
    beginSend()
  }

  function save(): Promise<'sent' | 'kept' | null> {
    const tank = parseQuantityText(draft.tankL)
    const body = { id, code: draft.code, name: draft.name, tankL: tank.ok ? tank.value : draft.tankL }
    return send(schemaErrors(createSprayerSchema, body), { kind: 'sprayer.create', farmId: farmId(), id, body })
  }

  return { draft, ...state, begin, save }
}
