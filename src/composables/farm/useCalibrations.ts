import { useQuery, type UseQueryReturnType } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import type { Calibration } from '../../../shared/contract/calibration.ts'
import { sprayerApi } from '../../api/sprayerApi.ts'
import { useSession } from '../../stores/session.ts'
import { readThrough } from '../app/readThrough.ts'

/** All calibrations of one sprayer, newest first. */
export function useCalibrations(sprayerId: MaybeRefOrGetter<string>): UseQueryReturnType<Calibration[], Error> {
  const session = useSession()
  const farmId = computed(() => session.farmId)
  const id = computed(() => toValue(sprayerId))
  return useQuery({
    queryKey: ['calibrations', farmId, id],
    enabled: () => farmId.value !== '' && id.value !== '',
    queryFn: () => readThrough(`${farmId.value}/calibrations/${id.value}`, session.user?.id ?? '', () => sprayerApi.calibrations(farmId.value, id.value)),
  })
}
