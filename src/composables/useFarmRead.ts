import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { useSession } from '../stores/session.ts'
import { readThrough } from './readThrough.ts'

/** One read of a farm under the key `[name, farmId]`, kept on this device; idle while no farm is open. */
export function useFarmRead<Answer>(
  name: string, farmId: MaybeRefOrGetter<string>, read: (farmId: string) => Promise<Answer>,
): UseQueryReturnType<Answer, Error> {
  const session = useSession()
  const id = computed(() => toValue(farmId))
  return useQuery({
    queryKey: [name, id],
    enabled: () => id.value !== '',
    queryFn: () => readThrough(`${id.value}/${name}`, session.user?.id ?? '', () => read(id.value)),
  })
}
