import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Person } from '../../shared/contract/farm.ts'
import { peopleApi } from '../api/peopleApi.ts'
import { useFarmRead } from './useFarmRead.ts'

/** All people of a farm. */
export function usePeople(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Person[], Error> {
  return useFarmRead('people', farmId, (id) => peopleApi.list(id))
}
