import { onScopeDispose, watch } from 'vue'
import { enterOverlay, leaveOverlay } from '../../plugins/overlayHistory.ts'

/** While something lies over the page, the browser's Back (on a phone: its button or gesture) closes that and leaves the page where it is. */
export function useBackCloses(isOpen: () => boolean, close: () => void): void {
  let id: string | null = null
  function leave(): void {
    if (id !== null) leaveOverlay(id)
    id = null
  }
  // At once: whoever closes it and opens another page does both in one go.
  watch(isOpen, (open) => {
    if (open) id = enterOverlay(() => { id = null; close() })
    else leave()
  }, { immediate: true, flush: 'sync' })
  onScopeDispose(leave)
}
