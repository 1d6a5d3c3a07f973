import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import type { GrantedSeason } from '../../shared/contract/grant.ts'
import { grantApi } from '../api/grantApi.ts'
import { useSession } from '../stores/session.ts'
import { readThrough } from './readThrough.ts'

/** Every season of every farm that is granted to whoever is signed in. */
export function useGrantedSeasons(): UseQueryReturnType<GrantedSeason[], Error> {
  const session = useSession()
  return useQuery({ queryKey: ['my-farms'], queryFn: () => readThrough('my-farms', session.user?.id ?? '', () => grantApi.mine()) })
}
