import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Lot } from '../../../shared/contract/input.ts'
import { lotApi } from '../../api/lotApi.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** All lots of a farm, with what is left of each. */
export function useLots(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Lot[], Error> {
  return useFarmRead('lots', farmId, (id) => lotApi.list(id))
}
