import type { BrowserContext, Page, Request } from '@playwright/test'
import { expect } from '@playwright/test'

const asked = new WeakMap<BrowserContext, Set<Request>>()
/** So many looks in a row must find nothing on its way: an answer may lead to the next question. */
const LOOKS = 3

/** Keeps count of what the pages of a context have asked for and not been answered; before its first page. */
export function countRequests(context: BrowserContext): void {
  const open = new Set<Request>()
  asked.set(context, open)
  context.on('request', (request) => { open.add(request) })
  const close = (request: Request): void => { open.delete(request) }
  context.on('requestfinished', close)
  context.on('requestfailed', close)
}

/** Waits until all that a page reads has come and is shown. Half a second of silence, the browser's own measure, is a third of a walk over all screens. */
export async function settled(page: Page): Promise<void> {
  await expect(page.getByRole('main')).toBeVisible()
  const open = asked.get(page.context()) ?? new Set<Request>()
  let looks = 0
  await expect.poll(async () => {
    const waits = await page.locator('[aria-busy="true"]').count()
    looks = waits === 0 && ![...open].some((request) => isOf(request, page)) ? looks + 1 : 0
    return looks
  }, { intervals: [40] }).toBeGreaterThanOrEqual(LOOKS)
}

/** A worker's request, and one of a frame that is gone, belong to no page. */
function isOf(request: Request, page: Page): boolean {
  try {
    return request.frame().page() === page
  } catch {
    return false
  }
}
