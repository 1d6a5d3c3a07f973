import { computed, type ComputedRef } from 'vue'
import { peopleApi } from '../../api/peopleApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'
import { useProof, type Proof } from './useProof.ts'
import { useSubmit } from '../form/useSubmit.ts'

/** Whether the open farm asks a second factor; `proof` turns it about. */
export function useFactorAsked(): { asked: ComputedRef<boolean | undefined>; isError: ComputedRef<boolean>; refetch: () => unknown; proof: Proof } {
  const session = useSession()
  const { submit } = useSubmit()
  const query = useFarmRead('factor-asked', () => session.farmId, (id) => peopleApi.factorAsked(id), () => session.isOfFarm)
  return {
    asked: computed(() => query.data.value),
    isError: computed(() => query.isError.value),
    refetch: () => query.refetch(),
    proof: useProof((password) => submit({ kind: 'farm.askFactor', farmId: session.farmId, id: session.farmId, body: { asked: query.data.value !== true, password } })),
  }
}
