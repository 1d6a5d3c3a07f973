import type { Page } from '@playwright/test'

/** What is wider than where it stands, and so cut off or scrolled sideways: each with its width and the width there is. */
export function findWide(page: Page): Promise<string[]> {
  return page.evaluate(() => [document.documentElement, ...document.querySelectorAll('#page, #page > .body, .panel, .label, .reg-wrap')]
    .filter((element) => element.scrollWidth > element.clientWidth + 1).map((element) => `${element.tagName} ${element.className} ${element.scrollWidth} in ${element.clientWidth}`))
}
