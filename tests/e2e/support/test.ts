import { test as base, expect } from '@playwright/test'
import { openFarm, signInTo, type FarmApi, type Who } from './demoFarm.ts'

interface TestThings {
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
