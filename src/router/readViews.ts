import type { Router } from 'vue-router'
import { routes } from './routes.ts'

/** Where a browser has no idle callback: after the first page has settled. */
const WAIT_MS = 2_000

/** Once somebody's first page stands, reads the other views too: without signal, a place never opened before would not open. */
export function readViewsWhenIdle(router: Router): void {
  const stop = router.afterEach((to) => {
    if (to.meta.open === true) return
    stop()
    if ('requestIdleCallback' in window) window.requestIdleCallback(readViews)
    else setTimeout(readViews, WAIT_MS)
  })
}

function readViews(): void {
  for (const { component } of routes) {
    // A view that does not come now comes when it is opened.
    if (typeof component === 'function') void (component as () => Promise<unknown>)().catch(() => undefined)
  }
}
