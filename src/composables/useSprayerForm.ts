import { reactive, ref, type Ref } from 'vue'
import { createSprayerSchema } from '../../shared/contract/farm.ts'
import { parseQuantityText } from '../../shared/units/parseQuantityText.ts'
import { fieldErrors } from './fieldErrors.ts'
import { newId } from './newId.ts'
import { useMessages } from './useMessages.ts'
import { useSchemaErrors } from './useSchemaErrors.ts'
import { useSubmit } from './useSubmit.ts'

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
  const { submit } = useSubmit()
  const messages = useMessages()
  const schemaErrors = useSchemaErrors()
  const draft = reactive({ code: '', name: '', tankL: '' })
  const errors = reactive<Record<string, string>>({})
  const refusal = ref('')
  const busy = ref(false)
  let id = newId()

  function show(found: Record<string, string>): void {
    for (const path of Object.keys(errors)) errors[path] = ''
    Object.assign(errors, found)
  }

  function begin(): void {
    id = newId()
    Object.assign(draft, { code: '', name: '', tankL: '' })
    refusal.value = ''
    show({})
  }

  async function save(): Promise<'sent' | 'kept' | null> {
    if (busy.value) return null
    const tank = parseQuantityText(draft.tankL)
    const body = { id, code: draft.code, name: draft.name, tankL: tank.ok ? tank.value : draft.tankL }
    const found = schemaErrors(createSprayerSchema, body)
    refusal.value = ''
    show(found)
    if (Object.keys(found).length > 0) return null
    busy.value = true
    try {
      return (await submit({ kind: 'sprayer.create', farmId: farmId(), id, body })).state
    } catch (error) {
      show(fieldErrors(error))
      if (Object.keys(fieldErrors(error)).length === 0) refusal.value = messages.problem(error)
      return null
    } finally {
      busy.value = false
    }
  }

  return { draft, errors, refusal, busy, begin, save }
}
