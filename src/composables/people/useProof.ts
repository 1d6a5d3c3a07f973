import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { ApiError } from '../../api/errors.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask } from '../form/useTask.ts'

/** Something that is done once a password was asked again. */
export interface Proof {
  password: Ref<string>
  /** Words at the fields, by their names; the password's among them. */
  errors: ComputedRef<Record<string, string>>
  /** What was refused and belongs to no field; empty where nothing was. */
  refusal: ComputedRef<string>
  busy: Ref<boolean>
  /** Empties what was typed and said. */
  begin: () => void
  /** Answers whether it was done. */
  run: () => Promise<boolean>
}

/** @param deed gets the password as it was typed. @param fields the names of the form's fields; a refusal elsewhere stands above them. */
export function useProof(deed: (password: string) => Promise<unknown>, fields: readonly string[] = ['password']): Proof {
  const messages = useMessages()
  const password = ref('')
  const task = useTask(async () => { await deed(password.value); return true })
  const errors = computed(() => fieldErrors(task.error.value))
  const refusal = computed(() => {
    if (task.error.value === null || fields.some((name) => errors.value[name] !== undefined)) return ''
    const [first] = task.error.value instanceof ApiError ? task.error.value.problem.errors : []
    return first?.message ?? messages.problem(task.error.value)
  })
  return {
    password, errors, refusal, busy: task.running,
    begin: () => { password.value = ''; task.error.value = null },
    run: async () => !task.running.value && (await task.run()) === true,
  }
}
