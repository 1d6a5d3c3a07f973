import { computed, type ComputedRef } from 'vue'
import type { RegisterLine } from '../../../shared/register/registerLine.ts'
import { useSession } from '../../stores/session.ts'
import { useRecords } from './useRecords.ts'
import { useRegisterLines } from './useRegisterLines.ts'

/** As many as are signed at once. */
const MOST = 50

/** Started records whose work has ended: they wait for a signature. An applicator sees their own. */
export function useWaitingRecords(): ComputedRef<RegisterLine[]> {
  const session = useSession()
  const started = useRecords(computed(() => session.farmId), { limit: MOST, state: 'started' })
  const { present } = useRegisterLines()
  return computed(() => {
    const rows = (started.data.value?.pages ?? []).flatMap(({ items }) => items).filter(({ endedAt }) => endedAt !== null)
    return present(rows).filter(({ by }) => session.canManage || by === session.user?.name)
  })
}
