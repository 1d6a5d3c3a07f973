import type { UseQueryReturnType } from '@tanstack/vue-query'
import type { MaybeRefOrGetter } from 'vue'
import type { Season } from '../../../shared/contract/seasonReport.ts'
import { seasonApi } from '../../api/seasonApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from './useFarmRead.ts'

/** The seasons of a farm that this reader may take reports of, the newest first. */
export function useSeasons(farmId: MaybeRefOrGetter<string>): UseQueryReturnType<Season[], Error> {
  const session = useSession()
  return useFarmRead('seasons', farmId, (id) => seasonApi.list(id), () => session.role !== null && session.role !== 'applicator')
}
