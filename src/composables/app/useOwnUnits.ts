import { watch } from 'vue'
import { usePreferences } from '../../stores/preferences.ts'
import { useSession } from '../../stores/session.ts'
import { useFarm } from '../farm/useFarm.ts'

/**
 * Keeps what figures are read in to what the person chose, else to what the open farm reads first. Called once, by the frame;
 * `useFigures` and `preferences.reader` read it, nobody else writes it.
 */
export function useOwnUnits(): void {
  const session = useSession()
  const preferences = usePreferences()
  const { data: farm } = useFarm(() => session.farmId)
  watch(
    () => session.user?.preferences.units ?? farm.value?.units,
    (units) => { if (units !== undefined) preferences.units = units },
    { immediate: true, flush: 'sync' },
  )
}
