import { onScopeDispose, ref, type Ref } from 'vue'
import { device, watchDrafts } from '../../plugins/device.ts'

/** How many drafts this device keeps, whoever began them; their words are read only by their own account. */
export function useKeptDrafts(): { count: Ref<number> } {
  const count = ref(0)
  async function recount(): Promise<void> {
    count.value = await device.drafts.count().catch(() => 0)
  }
  onScopeDispose(watchDrafts(() => void recount()))
  void recount()
  return { count }
}
