import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { registerApi } from '../../api/registerApi.ts'
import type { RegisterFilter, RegisterTotals } from '../../../shared/contract/register.ts'

/** What all records of a filter add up to, read again with the records. */
export function useRegisterTotals(farmId: MaybeRefOrGetter<string>, filter: MaybeRefOrGetter<RegisterFilter>): UseQueryReturnType<RegisterTotals, Error> {
  const id = computed(() => toValue(farmId))
  const wanted = computed(() => toValue(filter))
  return useQuery({
    queryKey: ['records', id, 'totals', wanted],
    enabled: () => id.value !== '',
    queryFn: () => registerApi.totals(id.value, wanted.value),
  })
}
