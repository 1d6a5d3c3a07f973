import type { Locator, Page } from '@playwright/test'
import { say } from './words.ts'

/** The line of the register that holds these words. */
export function registerRow(page: Page, isPhone: boolean, words: string): Locator {
  const rows = isPhone
    ? page.getByRole('list', { name: say('register.caption') }).getByRole('listitem')
    : page.getByRole('table', { name: say('register.caption') }).getByRole('row')
  return rows.filter({ hasText: words })
}
