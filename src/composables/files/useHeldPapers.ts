import { useQuery, useQueryClient } from '@tanstack/vue-query'
import { computed, type ComputedRef, type Ref } from 'vue'
import type { Attachment } from '../../../shared/contract/attachment.ts'
import { fileApi } from '../../api/fileApi.ts'
import { heldPaperApi, type PaperHolder } from '../../api/heldPaperApi.ts'
import { useSession } from '../../stores/session.ts'
import { fieldErrors } from '../form/fieldErrors.ts'
import { newId } from '../form/newId.ts'
import { useMessages } from '../app/useMessages.ts'
import { useTask } from '../form/useTask.ts'

export type { PaperHolder }

export interface HeldPapers {
  /** Undefined until they are read. */
  papers: ComputedRef<Attachment[] | undefined>
  failed: ComputedRef<boolean>
  retry: () => void
  /** Where a browser opens it. */
  addressOf: (id: string) => string
  add: (file: File) => Promise<unknown>
  takeBack: (id: string) => Promise<unknown>
  busy: Ref<boolean>
  /** Why the last one was not taken, empty where it was. */
  refusal: ComputedRef<string>
}

/** The papers of one thing: read, added, taken back. */
export function useHeldPapers(holder: () => PaperHolder): HeldPapers {
  const session = useSession()
  const client = useQueryClient()
  const messages = useMessages()
  const key = computed(() => ['held-papers', session.farmId, holder()])
  const query = useQuery({ queryKey: key, enabled: () => session.isOfFarm, queryFn: () => heldPaperApi.list(session.farmId, holder()) })
  const refresh = (): Promise<void> => client.invalidateQueries({ queryKey: key.value })
  const task = useTask(async (deed: { add: File } | { takeBack: string }) => {
    if ('add' in deed) await heldPaperApi.add(session.farmId, holder(), { id: newId(), file: deed.add })
    else await fileApi.remove(session.farmId, deed.takeBack)
    await refresh()
  })
  return {
    papers: computed(() => query.data.value),
    failed: computed(() => query.isError.value && query.data.value === undefined),
    retry: () => { void query.refetch() },
    addressOf: (id) => fileApi.address(session.farmId, id),
    add: (file) => task.run({ add: file }),
    takeBack: (id) => task.run({ takeBack: id }),
    busy: task.running,
    refusal: computed(() => (task.error.value === null ? '' : Object.values(fieldErrors(task.error.value))[0] ?? messages.problem(task.error.value))),
  }
}
