import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import type { GrantedSeasons } from '../../../shared/contract/grant.ts'
import { grantApi } from '../../api/grantApi.ts'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'

/** Every season of every farm that is granted to whoever is signed in, and what has ended. */
export function useGrantedSeasons(): UseQueryReturnType<GrantedSeasons, Error> {
  const session = useSession()
  return useQuery({ queryKey: ['my-farms'], queryFn: () => readThrough('my-farms', session.user?.id ?? '', () => grantApi.mine()) })
}
