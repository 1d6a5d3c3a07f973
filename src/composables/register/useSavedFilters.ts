import { computed, type ComputedRef } from 'vue'
import type { SavedFilter } from '../../../shared/contract/savedFilter.ts'
import { registerApi } from '../../api/registerApi.ts'
import { useSession } from '../../stores/session.ts'
import { newId } from '../form/newId.ts'
import type { RegisterChoice } from './registerAddress.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask, type Task } from '../form/useTask.ts'

export interface SavedFilters {
  filters: ComputedRef<SavedFilter[]>
  keep: Task<[name: string, choice: RegisterChoice], unknown>
  forget: Task<[id: string], unknown>
}

/** The filters that one keeps on this farm for oneself. */
export function useSavedFilters(): SavedFilters {
  const session = useSession()
  const { submit } = useSubmit()
  const { data } = useFarmRead('filters', () => session.farmId, (id) => registerApi.filters(id))
  return {
    filters: computed(() => data.value ?? []),
    keep: useTask((name, { filter, sort }) => {
      const id = newId()
      return submit({ kind: 'filter.keep', farmId: session.farmId, id, body: { id, name, query: { ...filter, sort } } })
    }),
    forget: useTask((id) => submit({ kind: 'filter.forget', farmId: session.farmId, id, body: {} })),
  }
}
