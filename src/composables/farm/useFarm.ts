import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Farm } from '../../../shared/contract/farm.ts'
import { farmApi } from '../../api/farmApi.ts'
import { useFarmRead } from './useFarmRead.ts'

/** A farm's own facts. */
export function useFarm(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Farm, Error> {
  return useFarmRead('farm', farmId, (id) => farmApi.read(id))
}
