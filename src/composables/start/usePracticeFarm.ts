import { computed, type ComputedRef } from 'vue'
import { useRouter } from 'vue-router'
import { useSession } from '../../stores/session.ts'
import { newId } from '../form/newId.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** The farm to try things on: opened beside the own farms, and put away. */
export function usePracticeFarm(): {
  busy: ComputedRef<boolean>
  /** What failed; null where nothing did. */
  error: ComputedRef<unknown>
  /** Makes it, or finds it, and opens it. */
  open: () => Promise<void>
  /** Ends it and opens another farm of this account. */
  putAway: () => Promise<boolean>
} {
  const session = useSession()
  const router = useRouter()
  const { submit } = useSubmit()
  const id = newId()
  const making = useTask(() => submit({ kind: 'practice.make', farmId: session.farmId, id, body: { id } }))
  const leaving = useTask(() => submit({ kind: 'practice.away', farmId: session.farmId, id, body: {} }))

  return {
    busy: computed(() => making.running.value || leaving.running.value),
    error: computed(() => making.error.value ?? leaving.error.value ?? null),
    open: async () => {
      const sent = await making.run()
      if (sent?.state !== 'sent') return
      await session.open(sent.answer.id)
      await router.push('/')
    },
    putAway: async () => {
      const sent = await leaving.run()
      if (sent?.state !== 'sent') return false
      const own = session.memberships.find(({ farmId }) => farmId !== session.farmId)
      await session.open(own?.farmId ?? '')
      await router.push(own === undefined ? '/farms/new' : '/')
      return true
    },
  }
}
