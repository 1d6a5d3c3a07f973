import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'

/** One read of a farm under the key `[name, farmId]`, kept on this device; idle while no farm is open or the role on it may not read that. */
export function useFarmRead<Answer>(
  name: string, farmId: MaybeRefOrGetter<string>, read: (farmId: string) => Promise<Answer>, isAllowed: () => boolean = () => true,
): UseQueryReturnType<Answer, Error> {
  const session = useSession()
  const id = computed(() => toValue(farmId))
  return useQuery({
    queryKey: [name, id],
    enabled: () => id.value !== '' && isAllowed(),
    queryFn: () => readThrough(`${id.value}/${name}`, session.user?.id ?? '', () => read(id.value)),
  })
}
