import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'

/** One read of a block under the key `[name, farmId, blockId]`, kept on this device; idle while no block is open. */
export function useBlockRead<Answer>(
  name: string, blockId: MaybeRefOrGetter<string>, read: (farmId: string, blockId: string) => Promise<Answer>,
): UseQueryReturnType<Answer, Error> {
  const session = useSession()
  const farmId = computed(() => session.farmId)
  const id = computed(() => toValue(blockId))
  return useQuery({
    queryKey: [name, farmId, id],
    enabled: () => farmId.value !== '' && id.value !== '',
    queryFn: () => readThrough(`${farmId.value}/${name}/${id.value}`, session.user?.id ?? '', () => read(farmId.value, id.value)),
  })
}
