import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Person } from '../../../shared/contract/person.ts'
import { peopleApi } from '../../api/peopleApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** All people of a farm; a certifier may not read them and does not ask. */
export function usePeople(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Person[], Error> {
  const session = useSession()
  return useFarmRead('people', farmId, (id) => peopleApi.list(id), () => session.isOfFarm)
}
