import type { Job } from '../../../shared/contract/job.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'

/** Jobs due and late on the open farm, by their day. */
export function useJobsWaiting(isWanted: () => boolean = () => true): ReturnType<typeof useFarmRead<Job[]>> {
  const session = useSession()
  return useFarmRead('jobs-waiting', () => session.farmId, readWaiting, () => session.isOfFarm && isWanted())
}

/** What reads plans and jobs comes after the first page: the spine counts jobs on the way to a new record too. */
async function readWaiting(farmId: string): Promise<Job[]> {
  const { roundApi } = await import('../../api/roundApi.ts')
  return roundApi.waiting(farmId)
}
