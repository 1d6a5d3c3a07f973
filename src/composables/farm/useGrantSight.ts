import { useInfiniteQuery, useQuery } from '@tanstack/vue-query'
import { computed, ref, type ComputedRef, type Ref } from 'vue'
import type { RegisterFilter, RegisterSort } from '../../../shared/contract/register.ts'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { grantApi } from '../../api/grantApi.ts'
import { useSession } from '../../stores/session.ts'
import { useRegisterLines, type RegisterWords } from '../register/useRegisterLines.ts'
import { useSumWords, type SumWords } from '../register/useSumWords.ts'

interface Rows { isError: Ref<boolean>; error: Ref<Error | null>; refetch: () => unknown; hasNextPage: Ref<boolean>; isFetchingNextPage: Ref<boolean>; isFetchNextPageError: Ref<boolean>; fetchNextPage: () => unknown }

export interface GrantSight extends Pick<RegisterWords, 'outlines'> {
  season: Ref<number | null>
  sort: Ref<RegisterSort>
  rows: Rows
  lines: ComputedRef<RegisterLine[]>
  isReady: ComputedRef<boolean>
  sums: ComputedRef<{ found: number | null; late: number; signed: number }>
  sumWords: ComputedRef<SumWords | null>
}

/** The register as the server answers the certifier of a grant; nothing of it is kept on the device. */
export function useGrantSight(grantId: () => string): GrantSight {
  const session = useSession()
  const season = ref<number | null>(null)
  const sort = ref<RegisterSort>('-when')
  const filter = computed<RegisterFilter>(() => (season.value === null ? {} : { season: season.value }))
  const key = [computed(() => session.farmId), computed(grantId), filter]
  const enabled = (): boolean => session.farmId !== '' && session.role === 'owner'
  const rows = useInfiniteQuery({
    queryKey: ['grant-sight', ...key, sort], enabled,
    queryFn: ({ pageParam }) => grantApi.seenRecords(session.farmId, grantId(), { ...filter.value, sort: sort.value, limit: 50 }, pageParam),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.next ?? undefined,
  })
  const totals = useQuery({ queryKey: ['grant-sight', 'totals', ...key], enabled, queryFn: () => grantApi.seenTotals(session.farmId, grantId(), filter.value) })
  const { place, present, outlines } = useRegisterLines()
  const { wordsOf } = useSumWords()
  const lines = computed(() => present(rows.data.value?.pages.flatMap((page) => page.items) ?? []))
  return {
    season, sort, rows, lines, outlines,
    isReady: computed(() => rows.data.value !== undefined && place.value !== null),
    sums: computed(() => ({ found: totals.data.value?.found ?? null, late: totals.data.value?.late ?? 0, signed: totals.data.value?.records ?? 0 })),
    sumWords: computed(() => (totals.data.value === undefined ? null : wordsOf({ ...totals.data.value, signed: totals.data.value.records }))),
  }
}
