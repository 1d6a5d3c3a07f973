import type { Router } from 'vue-router'
import { LATER_COMPONENTS } from '../components/laterPart.ts'
import { LATER_PARTS } from '../views/frame/laterParts.ts'
import { routes } from './routes.ts'

/** Where a browser has no idle callback: after the first page has settled. */
const WAIT_MS = 2_000

/** Once somebody's first page stands, reads the other views and sheets too: without signal, a place never opened before would not open. */
export function readViewsWhenIdle(router: Router): void {
  const stop = router.afterEach((to) => {
    if (to.meta.open === true) return
    stop()
    if ('requestIdleCallback' in window) window.requestIdleCallback(readViews)
    else setTimeout(readViews, WAIT_MS)
  })
}

function readViews(): void {
  const views = routes.flatMap(({ component }) => (typeof component === 'function' ? [component as () => Promise<unknown>] : []))
  // What does not come now comes when it is opened.
  for (const read of [...views, ...Object.values(LATER_COMPONENTS), ...Object.values(LATER_PARTS)]) void read().catch(() => undefined)
}
