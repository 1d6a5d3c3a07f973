import type { UseQueryReturnType } from '@tanstack/vue-query'
import { computed, type MaybeRefOrGetter } from 'vue'
import type { PersonPaper } from '../../../shared/contract/person.ts'
import { peopleApi } from '../../api/peopleApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** Training and licences of all people of a farm, the one that runs out first before the others. */
export function usePersonPapers(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<PersonPaper[], Error> {
  const session = useSession()
  return useFarmRead('person-papers', farmId, (id) => peopleApi.papers(id), () => session.isOfFarm)
}

/** Those of one person. */
export function usePapersOf(farmId: () => string, personId: () => string) {
  const query = usePersonPapers(farmId)
  return { query, papers: computed(() => query.data.value?.filter(({ person }) => person.id === personId())) }
}
