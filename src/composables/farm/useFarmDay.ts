import { computed, type ComputedRef } from 'vue'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { useSession } from '../../stores/session.ts'
import { useClock } from '../app/useClock.ts'
import { useFarm } from './useFarm.ts'

/** The open farm's zone and its civil date today; null until the farm is read. */
export function useFarmDay(): { zone: ComputedRef<string | null>; today: ComputedRef<string | null> } {
  const session = useSession()
  const { time } = useClock()
  const { data: farm } = useFarm(() => session.farmId)
  const zone = computed(() => farm.value?.zone ?? null)
  return {
    zone,
    today: computed(() => (zone.value === null ? null : civilDateIn(zone.value, time.value.toISOString()))),
  }
}
