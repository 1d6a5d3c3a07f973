import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Grant } from '../../../shared/contract/grant.ts'
import { grantApi } from '../../api/grantApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from './useFarmRead.ts'

/** The grants of a farm, for its owner. */
export function useGrants(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Grant[], Error> {
  const session = useSession()
  return useFarmRead('grants', farmId, (id) => grantApi.list(id), () => session.role === 'owner')
}
