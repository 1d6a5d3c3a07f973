import { ref, type Ref } from 'vue'
import type { Position } from '../../../shared/geo/geometryTypes.ts'

type Trouble = 'refused' | 'unknown'

/** A reading that takes longer is given up, ms. */
const PATIENCE_MS = 20_000

/** Where this device is, asked once at a press; the browser asks its person whether that may be told. */
export function useWhereIAm(found: (at: Position) => void): { busy: Ref<boolean>; trouble: Ref<Trouble | null>; ask: () => void } {
  const busy = ref(false)
  const trouble = ref<Trouble | null>(null)

  function end(said: Trouble | null): void {
    busy.value = false
    trouble.value = said
  }

  function ask(): void {
    if (busy.value) return
    // Pages that did not come over TLS have none.
    if (!('geolocation' in navigator)) { end('unknown'); return }
    busy.value = true
    trouble.value = null
    navigator.geolocation.getCurrentPosition(
      ({ coords }) => { end(null); found([coords.longitude, coords.latitude]) },
      ({ code, PERMISSION_DENIED }) => { end(code === PERMISSION_DENIED ? 'refused' : 'unknown') },
      { timeout: PATIENCE_MS },
    )
  }
  return { busy, trouble, ask }
}
