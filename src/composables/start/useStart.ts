import { computed, type ComputedRef } from 'vue'
import type { Start, StartStep, UpdateStart } from '../../../shared/contract/start.ts'
import { startApi } from '../../api/startApi.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmRead } from '../farm/useFarmRead.ts'
import { useSubmit } from '../form/useSubmit.ts'

/** The first hour of the open farm: read by who leads it, changed by skipping and putting away. */
export function useStart(): {
  query: ReturnType<typeof useFarmRead<Start>>
  doneCount: ComputedRef<number>
  /** The first step that is neither done nor skipped; null when none is left. */
  next: ComputedRef<StartStep | null>
  skip: (step: StartStep, skipped: boolean) => Promise<void>
  putAway: (away: boolean) => Promise<void>
} {
  const session = useSession()
  const { submit } = useSubmit()
  const query = useFarmRead('start', () => session.farmId, (id) => startApi.read(id), () => session.canManage)
  const steps = computed(() => query.data.value?.steps ?? [])

  async function change(body: UpdateStart): Promise<void> {
    await submit({ kind: 'start.update', farmId: session.farmId, id: session.farmId, body })
    await query.refetch()
  }

  return {
    query,
    doneCount: computed(() => steps.value.filter(({ state }) => state === 'done').length),
    next: computed(() => steps.value.find(({ state }) => state === 'open')?.step ?? null),
    skip: (step, skipped) => {
      const now = steps.value.filter((each) => each.state === 'skipped').map((each) => each.step)
      return change({ skipped: skipped ? [...now, step] : now.filter((each) => each !== step) })
    },
    putAway: (away) => change({ away }),
  }
}
