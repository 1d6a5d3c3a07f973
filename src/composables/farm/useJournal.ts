import { useInfiniteQuery } from '@tanstack/vue-query'
import { computed, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { useRoute, useRouter } from 'vue-router'
import { journalFilterSchema, type JournalEntry, type JournalFilter } from '../../../shared/contract/journal.ts'
import { JOURNAL_KINDS } from '../../../shared/journal/journalActions.ts'
import { journalApi } from '../../api/journalApi.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { usePeople } from '../people/usePeople.ts'

/** What is filtered by, as it stands in an address. */
const chosenOf = (filter: JournalFilter): [string, string][] => Object.entries(filter).filter((pair): pair is [string, string] => pair[1] !== undefined)

/** What an address asks for; what cannot be read of it is left out. */
function readFilter(query: Record<string, unknown>): JournalFilter {
  const read = (['person', 'kind', 'day', 'subject'] as const).map((name) => journalFilterSchema.safeParse({ [name]: query[name] }))
  return Object.assign({}, ...read.map(({ data }) => Object.fromEntries(Object.entries(data ?? {}).filter(([, value]) => value !== undefined)))) as JournalFilter
}

interface Option { value: string; label: string }

export interface Journal {
  filter: Ref<JournalFilter>
  entries: ComputedRef<JournalEntry[]>
  rows: { isError: Ref<boolean>; error: Ref<Error | null>; refetch: () => unknown; hasNextPage: Ref<boolean>; isFetchingNextPage: Ref<boolean>; fetchNextPage: () => unknown }
  isReady: ComputedRef<boolean>
  people: ComputedRef<Option[]>
  kinds: ComputedRef<Option[]>
  csvHref: ComputedRef<string>
}

/** The farm's journal of a filter, the newest deed first, page by page. */
export function useJournal(): Journal {
  const { t } = useI18n()
  const session = useSession()
  const preferences = usePreferences()
  const { data: people } = usePeople(() => session.farmId)
  const route = useRoute()
  const router = useRouter()
  /** Stands in the address, so that a page can lead to the deeds of its own thing. */
  const filter = computed<JournalFilter>({
    get: () => readFilter(route.query),
    set: (wanted) => { void router.replace({ query: Object.fromEntries(chosenOf(wanted)) }) },
  })
  const rows = useInfiniteQuery({
    queryKey: ['journal', computed(() => session.farmId), filter],
    enabled: () => session.farmId !== '',
    queryFn: ({ pageParam }) => journalApi.page(session.farmId, filter.value, pageParam),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.next ?? undefined,
  })
  return {
    filter, rows,
    entries: computed(() => rows.data.value?.pages.flatMap((page) => page.items) ?? []),
    isReady: computed(() => rows.data.value !== undefined),
    people: computed(() => (people.value ?? []).map(({ id, name }) => ({ value: id, label: name }))),
    kinds: computed(() => JOURNAL_KINDS.map((kind) => ({ value: kind, label: t(`journal.kind.${kind}`) }))),
    csvHref: computed(() => `/api/farms/${session.farmId}/journal/csv?${new URLSearchParams([...chosenOf(filter.value), ['language', preferences.language]]).toString()}`),
  }
}
