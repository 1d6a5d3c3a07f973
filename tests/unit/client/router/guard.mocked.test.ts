import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { createMemoryHistory, createRouter, type Router } from 'vue-router'
import type { Role, Session } from '../../../../shared/contract/session.ts'
import { ApiError, NetworkError } from '../../../../src/api/errors.ts'
import { guard } from '../../../../src/router/guard.ts'
import { routes } from '../../../../src/router/routes.ts'
import { buildUser } from '../buildUser.ts'
import { MemoryTable } from '../memoryTable.ts'

const here = vi.hoisted(() => ({ device: {} as { reads: unknown }, read: vi.fn() }))
vi.mock('../../../../src/plugins/device.ts', () => ({ device: here.device }))
vi.mock('../../../../src/api/sessionApi.ts', () => ({ sessionApi: { read: here.read } }))

const sessionOf = (role: Role): Session => ({
  user: buildUser(),
  memberships: [{ farmId: 'f', farmName: 'F', role, personId: null, seasons: null, factorNeeded: false }],
})
const signedOut = new ApiError({ type: 'about:blank', title: 'x', status: 401, code: 'unauthenticated', detail: '', errors: [], requestId: 'r' })

function openRouter(): Router {
  const blank = { template: '<p />' }
  const router = createRouter({ history: createMemoryHistory(), routes: routes.map((route) => ({ ...route, component: blank }) as typeof route) })
  router.beforeEach(guard)
  return router
}

beforeEach(() => {
  here.device.reads = new MemoryTable<{ key: string }>('key')
  here.read.mockReset()
  setActivePinia(createPinia())
})

describe('guard', () => {
  it('sends who is not signed in to the cover, with the way back', async () => {
    here.read.mockRejectedValue(signedOut)
    const router = openRouter()
    await router.push('/register/new?draft=d1')
    expect(router.currentRoute.value).toMatchObject({ name: 'sign-in', query: { next: '/register/new?draft=d1' } })
  })

  it.each(['/check/abcd', '/welcome/token', '/signin'])('leaves %s open', async (path) => {
    here.read.mockRejectedValue(signedOut)
    const router = openRouter()
    await router.push(path)
    expect(router.currentRoute.value.fullPath).toBe(path)
  })

  it('starts a certifier at My farms, and has no Farm for one', async () => {
    here.read.mockResolvedValue(sessionOf('certifier'))
    const router = openRouter()
    await router.push('/')
    expect(router.currentRoute.value.name).toBe('my-farms')
    await router.push('/farm')
    expect(router.currentRoute.value.name).toBe('not-found')
  })

  it.each([[false, '/', 'farm-new'], [false, '/farms', 'farm-new'], [true, '/', 'my-farms'], [true, '/register', 'my-farms'], [true, '/farms/new', 'farm-new'], [true, '/me', 'me'], [false, '/me', 'farm-new']])(
    'takes who has no farm, and had grants %s, at %s to %s', async (hadGrants, path, name) => {
      here.read.mockResolvedValue({ user: buildUser(), memberships: [], hadGrants })
      const router = openRouter()
      await router.push(path)
      expect(router.currentRoute.value.name).toBe(name)
    },
  )

  it.each([['applicator', '/blocks/new', 'not-found'], ['manager', '/blocks/new', 'block-new'], ['applicator', '/register/new', 'record-new'], ['manager', '/farms', 'not-found']] as const)(
    'takes the %s at %s to %s', async (role, path, name) => {
      here.read.mockResolvedValue(sessionOf(role))
      const router = openRouter()
      await router.push(path)
      expect(router.currentRoute.value.name).toBe(name)
    },
  )

  it('opens without signal as whoever was last', async () => {
    here.read.mockResolvedValueOnce(sessionOf('applicator'))
    await openRouter().push('/')
    setActivePinia(createPinia())
    here.read.mockRejectedValue(new NetworkError())
    const router = openRouter()
    await router.push('/register')
    expect(router.currentRoute.value.name).toBe('register')
  })
})
