import type { Page } from '@playwright/test'
import axe from 'axe-core'

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'best-practice']

/** What axe finds wrong on the page as it stands, a line each: rule, element, why. Of `only` one rule where that is all that differs. */
export async function findFaults(page: Page, only?: 'color-contrast'): Promise<string[]> {
  // Given to the browser by its own debugger, which the policy of the page does not bind.
  if (await page.evaluate(() => !('axe' in globalThis))) await page.evaluate(axe.source)
  const results = await page.evaluate(
    (runOnly) => (globalThis as unknown as { axe: typeof axe }).axe.run(document, { runOnly, resultTypes: ['violations'] }),
    only === undefined ? { type: 'tag' as const, values: RULES } : { type: 'rule' as const, values: [only] },
  )
  return results.violations.flatMap(({ id, nodes }) => nodes.map(({ target, failureSummary }) => `${id} ${target.join(' ')}: ${failureSummary?.split('\n')[1]?.trim() ?? ''}`))
}
