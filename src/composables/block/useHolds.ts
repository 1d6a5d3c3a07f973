import type { UseQueryReturnType } from '@tanstack/vue-query'
import { computed, type ComputedRef } from 'vue'
import type { Hold } from '../../../shared/contract/hold.ts'
import { holdsNow, type Held } from '../../../shared/season/holdsNow.ts'
import { holdApi } from '../../api/holdApi.ts'
import { useSession } from '../../stores/session.ts'
import { keepSame } from '../app/keepSame.ts'
import { useClock } from '../app/useClock.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** What holds the blocks of the open farm, as its signed records have it. */
export interface Holds {
  /** Lines in force today; undefined until they are read. */
  lines: ComputedRef<readonly Hold[] | undefined>
  /** By block, as of this minute. */
  now: ComputedRef<ReadonlyMap<string, Held>>
  query: UseQueryReturnType<Hold[], Error>
}

export function useHolds(isWanted: () => boolean = () => true): Holds {
  const session = useSession()
  const { time } = useClock()
  const { today } = useFarmDay()
  const query = useFarmRead('holds', () => session.farmId, holdApi.today, isWanted)
  return {
    lines: computed(() => query.data.value),
    now: computed<ReadonlyMap<string, Held>>((before) => keepSame(before, today.value === null ? new Map() : holdsNow(query.data.value ?? [], time.value, today.value))),
    query,
  }
}
