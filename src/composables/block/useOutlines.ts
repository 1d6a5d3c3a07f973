import { computed, type ComputedRef } from 'vue'
import type { Boundary } from '../../../shared/contract/block.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from './useBlocks.ts'

/** The outlines of the open farm's blocks, by their ids; empty until they are read. */
export function useOutlines(): ComputedRef<ReadonlyMap<string, Boundary>> {
  const session = useSession()
  const { data: blocks } = useBlocks(() => session.farmId)
  return computed(() => new Map((blocks.value ?? []).map(({ id, geometry }) => [id, geometry])))
}
