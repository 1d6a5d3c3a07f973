import { computed, type ComputedRef } from 'vue'
import { blockApi } from '../../api/blockApi.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { boundaryLine, type BoundaryLine } from './boundaryWords.ts'
import { useBlockRead } from './useBlockRead.ts'

/** Every version of a block's outline. */
export interface Boundaries {
  query: ReturnType<typeof useBlockRead<Awaited<ReturnType<typeof blockApi.boundaries>>>>
  /** Newest first, in words. */
  lines: ComputedRef<BoundaryLine[]>
}

export function useBoundaries(id: () => string): Boundaries {
  const preferences = usePreferences()
  const query = useBlockRead('boundaries', id, blockApi.boundaries)
  return { query, lines: computed(() => (query.data.value ?? []).map((version) => boundaryLine(preferences.reader, version))) }
}
