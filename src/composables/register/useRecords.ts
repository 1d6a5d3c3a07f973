import { useInfiniteQuery, type InfiniteData, type UseInfiniteQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { recordApi, type RegisterPage, type RegisterQuery } from '../../api/recordApi.ts'

/** The register, newest first, page by page: `data.pages`, `fetchNextPage()`, `hasNextPage`. */
export function useRecords(
  farmId: MaybeRefOrGetter<string>, query: MaybeRefOrGetter<RegisterQuery> = {},
): UseInfiniteQueryReturnType<InfiniteData<RegisterPage, string | undefined>, Error> {
  const id = computed(() => toValue(farmId))
  const wanted = computed(() => toValue(query))
  return useInfiniteQuery({
    queryKey: ['records', id, wanted],
    enabled: () => id.value !== '',
    initialPageParam: undefined as string | undefined,
    queryFn: ({ pageParam }) => recordApi.page(id.value, wanted.value, pageParam),
    getNextPageParam: (page) => page.next ?? undefined,
  })
}
