import { liveQuery } from 'dexie'
import { onScopeDispose, ref, type Ref } from 'vue'
import { device } from '../plugins/device.ts'

/** How many drafts this device keeps, whoever began them; their words are read only by their own account. */
export function useKeptDrafts(): { count: Ref<number> } {
  const count = ref(0)
  const watching = liveQuery(() => device.drafts.count()).subscribe({
    next: (found) => { count.value = found },
    error: () => { count.value = 0 },
  })
  onScopeDispose(() => { watching.unsubscribe() })
  return { count }
}
