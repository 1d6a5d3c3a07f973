import { getCurrentScope, onScopeDispose } from 'vue'

/** Calls back whenever this device has signal again; ends with the scope. */
export function useSignalBack(back: () => void): void {
  window.addEventListener('online', back)
  if (getCurrentScope() !== undefined) onScopeDispose(() => { window.removeEventListener('online', back) })
}
