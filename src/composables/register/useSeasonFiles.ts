import { useQuery } from '@tanstack/vue-query'
import { computed, type ComputedRef, type Ref } from 'vue'
import { seasonApi } from '../../api/seasonApi.ts'
import { usePreferences } from '../../stores/preferences.ts'

/** A season that is to be taken away; null while none is chosen. */
export interface WantedSeason { farmId: string; season: number }

export interface SeasonFiles {
  csvHref: ComputedRef<string>
  /** One address a volume; empty until it is known how many there are. */
  pdfHrefs: ComputedRef<string[]>
  sheetHrefs: ComputedRef<string[]>
  isReading: Ref<boolean>
  error: Ref<Error | null>
  retry: () => void
}

/** Where a season is fetched as files; its volumes are counted once it is chosen. */
export function useSeasonFiles(wanted: () => WantedSeason | null): SeasonFiles {
  const preferences = usePreferences()
  const chosen = computed(wanted)
  const volumes = useQuery({
    queryKey: ['records', computed(() => chosen.value?.farmId ?? ''), 'season-volumes', computed(() => chosen.value?.season ?? 0), computed(() => preferences.language)],
    enabled: () => chosen.value !== null,
    queryFn: () => seasonApi.volumes(chosen.value?.farmId ?? '', chosen.value?.season ?? 0, preferences.language),
  })
  const href = (what: string, volume?: number): string =>
    `/api/farms/${chosen.value?.farmId ?? ''}/seasons/${chosen.value?.season ?? ''}/${what}?language=${preferences.language}${volume === undefined ? '' : `&volume=${volume}`}`
  const each = (what: string, count: number | undefined): string[] => Array.from({ length: count ?? 0 }, (_, place) => href(what, place + 1))
  return {
    csvHref: computed(() => href('csv')),
    pdfHrefs: computed(() => each('pdf', volumes.data.value?.report.volumes)),
    sheetHrefs: computed(() => each('sheets', volumes.data.value?.sheets.volumes)),
    isReading: volumes.isFetching,
    error: volumes.error,
    retry: () => { void volumes.refetch() },
  }
}
