import { field } from './support/controls.ts'
import { PASSWORD } from './support/demoFarm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeEndedRecord, makeLot, makeMaterial, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

test('several records are signed with one password, each says its number, and what a label holds from then on stands beside', async ({ page, signInAs, manager }) => {
  const labelled = await makeMaterial(manager, { label: { reEntryHours: '12', preHarvestDays: 2, source: 'part 3' } })
  const things = [{ ...(await makeThings(manager)), first: { material: labelled, lot: await makeLot(manager, labelled.id) } }, await makeThings(manager)] as const
  for (const each of things) await makeEndedRecord(manager, each)
  await signInAs('manager')
  await openScreen(page, '/')
  await page.getByRole('button', { name: say('recordForm.many.open') }).click()
  const dialog = page.getByRole('dialog', { name: say('recordForm.many.title') })
  const sign = dialog.getByRole('button', { name: /^Sign \d+ records?$/ })

  await sign.click()
  await expect(dialog.getByRole('alert')).toHaveText(say('recordForm.many.choose'))
  for (const { block } of things) await dialog.getByRole('checkbox', { name: new RegExp(`^${block.code}, `) }).check({ force: true })
  await field(dialog, say('records.sign.password')).fill('not the password')
  await sign.click()
  await expect(dialog.getByRole('alert')).toBeVisible()
  for (const { block } of things) await expect(dialog.getByRole('checkbox', { name: new RegExp(`^${block.code}, `) })).toBeChecked()
  await field(dialog, say('records.sign.password')).fill(PASSWORD)
  await sign.click()
  const results = dialog.getByRole('status')
  for (const { block } of things) await expect(results.getByText(new RegExp(`^${block.code}, .*signed as \\d{4}-\\d{4}`))).toBeVisible()

  // The list was on the page before the signature was.
  const held = page.getByRole('region', { name: say('blocks.held.inForce') })
  const [first, second] = things
  const rows = held.getByRole('listitem').filter({ has: page.getByRole('link', { name: first.block.code, exact: true }) })
  await expect(rows.filter({ hasText: /keep out until \d\d:\d\d/ })).toHaveCount(1)
  await expect(rows.first().getByRole('link', { name: /^\d{4}-\d{4}$/ })).toBeVisible()
  await expect(held.getByText(second.block.code)).toHaveCount(0)
  await expect(page.getByText(/Keep out of/)).toBeAttached()
})
