import { computed, type ComputedRef } from 'vue'
import { holdsInForce, type HoldInForce } from '../../../shared/today/holdsInForce.ts'
import { useSession } from '../../stores/session.ts'
import { useClock } from '../app/useClock.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useHolds } from '../block/useHolds.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'

/** What holds the open farm's blocks at this minute. */
export interface HoldsToday {
  holds: ComputedRef<readonly HoldInForce[]>
  /** True while neither the holds nor that they cannot be read is known. */
  isReading: ComputedRef<boolean>
  /** They cannot be read, and the device keeps none: nothing is known of them. */
  isFailed: ComputedRef<boolean>
  again: () => void
}

export function useHoldsToday(): HoldsToday {
  const session = useSession()
  const { time } = useClock()
  const { today } = useFarmDay()
  const blocks = useBlocks(() => session.farmId)
  const { lines, query } = useHolds()
  const isFailed = computed(() => [query, blocks].some(({ isError, data }) => isError.value && data.value === undefined))
  return {
    holds: computed(() => (today.value === null || lines.value === undefined ? [] : holdsInForce(lines.value, time.value, today.value, blocks.data.value ?? []))),
    isFailed,
    isReading: computed(() => !isFailed.value && (lines.value === undefined || blocks.data.value === undefined)),
    again: () => { for (const each of [query, blocks]) if (each.isError.value) void each.refetch() },
  }
}
