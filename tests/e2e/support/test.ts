import { test as base, expect } from '@playwright/test'
import { countRequests } from './settled.ts'
import { openFarm, signInTo, type FarmApi, type Who } from './demoFarm.ts'

interface TestThings {
  /**
   * Whether pages read the other views ahead, as they do once a browser is idle. That a fifth of a page's work is spared
   * where nothing of a test hangs on it: it is on where signal goes.
   */
  readsAhead: boolean
  /** True on the phone project. */
  isPhone: boolean
  /** Signs this test's browser in. */
  signInAs: (who: Who) => Promise<void>
}
interface WorkerThings {
  /** The API as the manager of the demo farm, in a session of its own: for making what a test needs. */
  manager: FarmApi
}

/** Every test: its own browser context, and the API beside it. */
export const test = base.extend<TestThings, WorkerThings>({
  readsAhead: [false, { option: true }],
  context: async ({ context, readsAhead }, use) => {
    countRequests(context)
    if (!readsAhead) await context.addInitScript(() => { window.requestIdleCallback = () => 0 })
    await use(context)
  },
  isPhone: async ({ viewport }, use) => { await use((viewport?.width ?? 0) < 720) },
  signInAs: async ({ context }, use) => {
    await use(async (who) => { await signInTo(context.request, who) })
  },
  manager: [async ({ playwright }, use, { project }) => {
    const request = await playwright.request.newContext({ baseURL: project.use.baseURL ?? '' })
    await use(await openFarm(request, 'manager'))
    await request.dispose()
  }, { scope: 'worker' }],
})

export { expect }
