import type { Router } from 'vue-router'
import { readLaterParts } from '../composables/app/laterPart.ts'
import { routes } from './routes.ts'

/** Where a browser has no idle callback: after the first page has settled. */
const WAIT_MS = 2_000

/** Once somebody's first page stands, reads the other views and sheets too: without signal, a place never opened before would not open. */
export function readViewsWhenIdle(router: Router): void {
  const stop = router.afterEach((to) => {
    if (to.meta.open === true) return
    stop()
    if ('requestIdleCallback' in window) window.requestIdleCallback(() => void readViews())
    else setTimeout(() => void readViews(), WAIT_MS)
  })
}

async function readViews(): Promise<void> {
  const views = routes.flatMap(({ component }) => (typeof component === 'function' ? [component as () => Promise<unknown>] : []))
  // What does not come now comes when it is opened. What the frame opens first: signal may go any moment.
  await readLaterParts()
  // A view read says which parts of it come later.
  await Promise.allSettled(views.map((read) => read()))
  await readLaterParts()
}
