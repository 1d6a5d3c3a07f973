import { computed, type ComputedRef, type Ref } from 'vue'
import { useQueryClient } from '@tanstack/vue-query'
import { heldPaperApi } from '../../api/heldPaperApi.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask } from '../form/useTask.ts'

/** Adds the paper itself to what is written down of it. */
export function usePaperFile(farmId: () => string): { add: (paperId: string, file: File) => Promise<unknown>; busy: Ref<boolean>; refusal: ComputedRef<string> } {
  const client = useQueryClient()
  const messages = useMessages()
  const task = useTask(async (paperId: string, file: File) => {
    await heldPaperApi.add(farmId(), { about: 'person-paper', id: paperId }, { id: newId(), file })
    await client.invalidateQueries({ queryKey: ['person-papers', farmId()] })
  })
  return {
    add: task.run, busy: task.running,
    refusal: computed(() => (task.error.value === null ? '' : Object.values(fieldErrors(task.error.value))[0] ?? messages.problem(task.error.value))),
  }
}
