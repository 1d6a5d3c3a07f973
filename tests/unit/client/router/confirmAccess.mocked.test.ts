import { flushPromises } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { createMemoryHistory, createRouter, type Router } from 'vue-router'
import type { Role, Session } from '../../../../shared/contract/session.ts'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import { queryClient } from '../../../../src/plugins/queryClient.ts'
import { confirmAccess } from '../../../../src/router/confirmAccess.ts'
import { guard } from '../../../../src/router/guard.ts'
import { routes } from '../../../../src/router/routes.ts'
import { useReentry } from '../../../../src/stores/reentry.ts'
import { buildUser } from '../buildUser.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as { reads: unknown }, read: vi.fn() }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))
vi.mock('../../../../src/api/sessionApi.ts', () => ({ sessionApi: { read: here.read } }))

const membership = (farmId: string, role: Role) => ({ farmId, farmName: farmId, role, personId: null, seasons: null, factorNeeded: false })
const sessionOf = (...memberships: Session['memberships']): Session => ({ user: buildUser(), memberships })
const ended = new ApiError({ type: 'about:blank', title: 'x', status: 401, code: 'unauthenticated', detail: '', errors: [], requestId: 'r' })

async function openRouter(first: Session): Promise<Router> {
  here.read.mockResolvedValueOnce(first)
  const blank = { template: '<p />' }
  const router = createRouter({ history: createMemoryHistory(), routes: routes.map((route) => ({ ...route, component: blank }) as typeof route) })
  router.beforeEach(guard)
  confirmAccess(router)
  await router.push('/register')
  queryClient.setQueryData(['lots', 'f'], ['read before'])
  return router
}
const kept = (): unknown => queryClient.getQueryData(['lots', 'f'])

beforeEach(() => {
  here.device.reads = new MemoryTable<{ key: string }>('key')
  here.read.mockReset()
  queryClient.clear()
  setActivePinia(createPinia())
})

describe('at each step to another place', () => {
  it('keeps what was read while one is let in as before, and asks nothing on the first page', async () => {
    const router = await openRouter(sessionOf(membership('f', 'manager')))
    expect(here.read).toHaveBeenCalledTimes(1)
    here.read.mockResolvedValue(sessionOf(membership('f', 'manager')))
    await router.push('/inputs')
    await vi.waitFor(() => { expect(here.read).toHaveBeenCalledTimes(2) })
    await flushPromises()
    expect([kept(), router.currentRoute.value.path]).toEqual([['read before'], '/inputs'])
  })

  it('forgets what was read and starts anew where the farm is not open any more, or in another role', async () => {
    for (const after of [sessionOf(membership('other', 'certifier')), sessionOf(membership('f', 'applicator'))]) {
      const router = await openRouter(sessionOf(membership('f', 'manager')))
      here.read.mockResolvedValue(after)
      await router.push('/inputs')
      await vi.waitFor(() => { expect(router.currentRoute.value.path).not.toBe('/inputs') })
      expect(kept()).toBeUndefined()
      setActivePinia(createPinia())
    }
  })

  it('asks who it is where the session has ended, before anything more is read', async () => {
    const router = await openRouter(sessionOf(membership('f', 'manager')))
    here.read.mockRejectedValue(ended)
    await router.push('/inputs')
    await vi.waitFor(() => { expect(useReentry().asking).toBe(true) })
  })

  it('goes on without signal', async () => {
    const router = await openRouter(sessionOf(membership('f', 'manager')))
    here.read.mockRejectedValue(new NetworkError())
    await router.push('/inputs')
    await vi.waitFor(() => { expect(here.read).toHaveBeenCalledTimes(2) })
    await flushPromises()
    expect([kept(), useReentry().asking, router.currentRoute.value.path]).toEqual([['read before'], false, '/inputs'])
  })
})
