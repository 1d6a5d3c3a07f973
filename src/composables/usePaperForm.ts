import { reactive, ref, type Ref } from 'vue'
import type { z } from 'zod'
import type { Command } from '../api/commandTypes.ts'
import { fieldErrors } from './fieldErrors.ts'
import { useMessages } from './useMessages.ts'
import { useSchemaErrors } from './useSchemaErrors.ts'
import { useSubmit } from './useSubmit.ts'

/** Sends a form once its own schema finds nothing; what was refused stands at its fields, or above them. */
export function usePaperForm(schema: z.ZodType): {
  errors: Record<string, string>
  refusal: Ref<string>
  busy: Ref<boolean>
  begin: () => void
  /** Answers whether it was sent, or kept until there is signal. */
  send: (body: object, command: Command<'paper.add'> | Command<'paper.change'>) => Promise<boolean>
} {
  const { submit } = useSubmit()
  const messages = useMessages()
  const schemaErrors = useSchemaErrors()
  const errors = reactive<Record<string, string>>({})
  const refusal = ref('')
  const busy = ref(false)

  function show(found: Record<string, string>): void {
    for (const path of Object.keys(errors)) errors[path] = ''
    Object.assign(errors, found)
  }
  function begin(): void {
    refusal.value = ''
    show({})
  }
  async function send(body: object, command: Command<'paper.add'> | Command<'paper.change'>): Promise<boolean> {
    if (busy.value) return false
    const found = schemaErrors(schema, body)
    refusal.value = ''
    show(found)
    if (Object.keys(found).length > 0) return false
    busy.value = true
    try {
      await submit(command)
      return true
    } catch (error) {
      show(fieldErrors(error))
      if (Object.keys(fieldErrors(error)).length === 0) refusal.value = messages.problem(error)
      return false
    } finally {
      busy.value = false
    }
  }
  return { errors, refusal, busy, begin, send }
}
