import { useQuery } from '@tanstack/vue-query'
import { computed, type ComputedRef, type Ref } from 'vue'
import { registerApi } from '../../api/registerApi.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { writeAddress, type RegisterChoice } from './registerAddress.ts'

export interface RegisterFiles {
  csvHref: ComputedRef<string>
  /** One address a volume; empty until it is known how many there are. */
  pdfHrefs: ComputedRef<string[]>
  isReading: Ref<boolean>
  error: Ref<Error | null>
  retry: () => void
}

/** Where the chosen records are fetched as files; volumes are counted while `isOpen`. */
export function useRegisterFiles(choice: () => RegisterChoice, isOpen: () => boolean): RegisterFiles {
  const session = useSession()
  const preferences = usePreferences()
  const wanted = computed(() => ({ ...choice().filter, sort: choice().sort, language: preferences.language }))
  const volumes = useQuery({
    queryKey: ['records', computed(() => session.farmId), 'volumes', wanted],
    enabled: () => isOpen() && session.farmId !== '',
    queryFn: () => registerApi.volumes(session.farmId, wanted.value),
  })
  const query = computed(() => new URLSearchParams({ ...writeAddress(choice()), language: preferences.language }).toString())
  const base = computed(() => `/api/farms/${session.farmId}/register`)
  return {
    csvHref: computed(() => `${base.value}/csv?${query.value}`),
    pdfHrefs: computed(() => Array.from({ length: volumes.data.value?.volumes ?? 0 }, (_, place) => `${base.value}/pdf?${query.value}&volume=${place + 1}`)),
    isReading: volumes.isFetching,
    error: volumes.error,
    retry: () => { void volumes.refetch() },
  }
}
