import type { Page } from '@playwright/test'
import { choose, segment } from './support/controls.ts'
import { RecordForm } from './support/recordForm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeThings } from './support/things.ts'
import { watchPages } from './support/watchPage.ts'
import { say, saying } from './support/words.ts'

test('opens dialogs, lists and sheets without one violation', async ({ page, context, isPhone, signInAs, manager }) => {
  const found = await watchPages(context)
  const things = await makeThings(manager)
  await signInAs('manager')
  await openScreen(page, '/inputs')
  await page.getByRole('button', { name: say('inputs.newMaterial') }).click()
  await choose(page, say('inputs.form.kind'), say('inputs.kind.ferment'))
  await page.getByRole('dialog', { name: say('inputs.form.materialTitle') }).getByRole('button', { name: say('inputs.cancel') }).click()
  await page.getByRole('main').getByRole('button', { name: say('inputs.receiveLot') }).first().click()
  await page.getByLabel(say('inputs.form.receivedOn')).fill('2026-05-04')
  await closeDialog(page, say('inputs.form.lotTitle'))
  await page.getByRole('button', { name: say('inputs.count') }).first().click()
  await closeDialog(page, saying('inputs.form.countTitle'))
  await openScreen(page, '/farm/sprayers')
  await page.getByRole('button', { name: say('farm.addSprayer') }).click()
  await closeDialog(page, say('farm.addSprayer'))
  await page.getByRole('button', { name: say('frame.more') }).click()
  const more = page.getByRole('dialog', { name: say('frame.moreSheet.title') })
  await segment(more, say('frame.moreSheet.dawn'))
  await closeDialog(page, say('frame.moreSheet.title'))

  await openScreen(page, '/blocks')
  await segment(page, say('blocks.map.show'))
  await page.getByRole('button', { name: say('blocks.map.zoomIn') }).click()
  await page.getByRole('button', { name: say('blocks.map.all'), exact: true }).click()

  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await form.checks()
  await form.closeChecks()
  await form.step(2).click()
  await expect(form.password).toBeVisible()
  expect(found).toEqual([])
})

async function closeDialog(page: Page, name: string | RegExp): Promise<void> {
  const dialog = page.getByRole('dialog', { name })
  await expect(dialog).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(dialog).toBeHidden()
  // Closing takes the page's own step out of the history: until then a new address would be cut off.
  await expect.poll(() => page.evaluate(() => (history.state as { overlay?: unknown } | null)?.overlay ?? null)).toBeNull()
}
