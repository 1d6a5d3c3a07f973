import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { recordApi } from '../../api/recordApi.ts'

/** One record with its checks; idle while `recordId` is empty. */
export function useRecord(
  farmId: MaybeRefOrGetter<string>, recordId: MaybeRefOrGetter<string>,
): UseQueryReturnType<ApplicationRecord, Error> {
  const farm = computed(() => toValue(farmId))
  const id = computed(() => toValue(recordId))
  return useQuery({
    queryKey: ['records', farm, 'one', id],
    enabled: () => farm.value !== '' && id.value !== '',
    queryFn: () => recordApi.read(farm.value, id.value),
  })
}
