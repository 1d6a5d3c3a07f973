import { computed, type ComputedRef } from 'vue'
import type { Job } from '../../../shared/contract/job.ts'
import { openJobs } from '../../../shared/rounds/openJobs.ts'
import { roundApi } from '../../api/roundApi.ts'
import { useSession } from '../../stores/session.ts'
import { useBlockRead } from './useBlockRead.ts'

/** Jobs of a block that are still to be done, the most urgent first: all that are late or due, and the next planned one. */
export function useBlockJobs(blockId: () => string): ComputedRef<Job[]> {
  const session = useSession()
  // A certifier may not read rounds and does not ask.
  const read = useBlockRead('block-jobs', () => (session.isOfFarm ? blockId() : ''), roundApi.ofBlock)
  return computed(() => openJobs((read.data.value ?? []).filter((job) => job.blockId === blockId())))
}
