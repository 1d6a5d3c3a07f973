import type { ChangeMe } from '../../../shared/contract/me.ts'
import { meApi } from '../../api/meApi.ts'
import { useSession } from '../../stores/session.ts'

/** Changes of one's own account: each goes over the state that was seen, and shows at once. */
export function useMe(): { change: (changes: Omit<ChangeMe, 'revision'>) => Promise<void> } {
  const session = useSession()
  return {
    change: async (changes) => {
      if (session.user === null) return
      session.acceptUser(await meApi.change({ revision: session.user.revision, ...changes }))
    },
  }
}
