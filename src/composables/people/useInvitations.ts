import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Invitation } from '../../../shared/contract/invitation.ts'
import { letterApi } from '../../api/letterApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** The invitations of a farm that wait; its owner alone asks for them. */
export function useInvitations(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Invitation[], Error> {
  const session = useSession()
  return useFarmRead('invitations', farmId, (id) => letterApi.invitations(id), () => session.role === 'owner')
}
