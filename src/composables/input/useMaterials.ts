import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Material } from '../../../shared/contract/input.ts'
import { materialApi } from '../../api/materialApi.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** All materials of a farm. */
export function useMaterials(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Material[], Error> {
  return useFarmRead('materials', farmId, (id) => materialApi.list(id))
}
