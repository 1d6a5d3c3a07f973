import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Sprayer } from '../../../shared/contract/farm.ts'
import { sprayerApi } from '../../api/sprayerApi.ts'
import { useFarmRead } from './useFarmRead.ts'

/** All sprayers of a farm. */
export function useSprayers(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Sprayer[], Error> {
  return useFarmRead('sprayers', farmId, (id) => sprayerApi.list(id))
}
