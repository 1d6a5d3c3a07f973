import { useQuery, useQueryClient } from '@tanstack/vue-query'
import { computed, ref, shallowRef, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import type { FactorOffer, FactorState } from '../../../shared/contract/me.ts'
import { meApi } from '../../api/meApi.ts'
import { useSession } from '../../stores/session.ts'
import { useProof, type Proof } from './useProof.ts'

/** One's own second factor: how it stands, setting it up in two steps, new recovery codes, taking it away. */
export interface Factor {
  state: ComputedRef<FactorState | undefined>
  isError: ComputedRef<boolean>
  refetch: () => unknown
  /** What the authenticator takes, while it is being set up. */
  offer: ShallowRef<FactorOffer | null>
  /** Recovery codes that are shown this once. */
  codes: ShallowRef<string[]>
  code: Ref<string>
  begin: Proof
  confirm: Proof
  renew: Proof
  remove: Proof
}

export function useFactor(): Factor {
  const session = useSession()
  const client = useQueryClient()
  const key = computed(() => ['own-factor', session.user?.id ?? ''])
  const query = useQuery({ queryKey: key, queryFn: () => meApi.factor() })
  const offer = shallowRef<FactorOffer | null>(null)
  const codes = shallowRef<string[]>([])
  const code = ref('')

  /** The farms that asked for it open with it, or close. */
  async function again(): Promise<void> {
    code.value = ''
    await Promise.all([client.invalidateQueries({ queryKey: key.value }), session.reload()])
  }

  const fields = ['password', 'code']
  return {
    state: computed(() => query.data.value),
    isError: computed(() => query.isError.value),
    refetch: () => query.refetch(),
    offer, codes, code,
    begin: useProof(async (password) => { offer.value = await meApi.beginFactor(password) }, fields),
    confirm: useProof(async () => {
      codes.value = await meApi.confirmFactor(code.value)
      offer.value = null
      await again()
    }, fields),
    renew: useProof(async (password) => {
      codes.value = await meApi.renewCodes({ password, code: code.value })
      await again()
    }, fields),
    remove: useProof(async (password) => {
      await meApi.removeFactor({ password, code: code.value })
      await again()
    }, fields),
  }
}
