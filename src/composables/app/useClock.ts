import { onScopeDispose, ref, type Ref } from 'vue'
import { now } from '../../plugins/clock.ts'

const TICK_MS = 30_000

/** The time of this device as a ref that moves on every half minute, and `now()` for the exact instant. */
export function useClock(): { time: Ref<Date>; now: () => Date } {
  const time = ref(now())
  const timer = window.setInterval(() => { time.value = now() }, TICK_MS)
  onScopeDispose(() => { window.clearInterval(timer) })
  return { time, now }
}
