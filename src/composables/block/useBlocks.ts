import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Block } from '../../../shared/contract/block.ts'
import { blockApi } from '../../api/blockApi.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** All blocks of a farm, in its own order. */
export function useBlocks(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Block[], Error> {
  return useFarmRead('blocks', farmId, (id) => blockApi.list(id))
}
