import { START_LOCATION, type Router } from 'vue-router'
import { ApiError } from '../api/errors.ts'
import { queryClient } from '../plugins/queryClient.ts'
import { useReentry } from '../stores/reentry.ts'
import { forgetReads } from '../stores/reads.ts'
import { useSession } from '../stores/session.ts'

/**
 * Behind each step to another place the server is asked who is let in still: what was read before does not outlive the right to
 * read it. Without signal, whoever was let in last goes on.
 */
export function confirmAccess(router: Router): void {
  router.afterEach((to, from, failure) => {
    if (failure === undefined && from !== START_LOCATION && to.meta.open !== true && to.path !== from.path) void confirm(router)
  })
}

async function confirm(router: Router): Promise<void> {
  const session = useSession()
  if (session.user === null) return
  const before = standing(session)
  try {
    await session.reload()
  } catch (error) {
    // Who gives up there is led to the cover by the question itself.
    if (!(error instanceof ApiError) || error.problem.status !== 401 || !(await useReentry().ask())) return
  }
  if (standing(session) === before) return
  queryClient.clear()
  await forgetReads()
  await router.replace('/')
}

/** Who it is, and what the open farm lets them do. */
function standing({ user, membership }: ReturnType<typeof useSession>): string {
  return JSON.stringify([user?.id, membership?.farmId, membership?.role, membership?.seasons])
}
