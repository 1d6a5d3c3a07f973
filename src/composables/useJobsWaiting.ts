import type { Job } from '../../shared/contract/job.ts'
import { roundApi } from '../api/roundApi.ts'
import { useSession } from '../stores/session.ts'
import { useFarmRead } from './useFarmRead.ts'

/** Jobs due and late on the open farm, by their day. */
export function useJobsWaiting(): ReturnType<typeof useFarmRead<Job[]>> {
  const session = useSession()
  return useFarmRead('jobs-waiting', () => session.farmId, (id) => roundApi.waiting(id), () => session.isOfFarm)
}
