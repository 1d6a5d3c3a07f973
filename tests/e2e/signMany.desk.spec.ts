import { field } from './support/controls.ts'
import { PASSWORD } from './support/demoFarm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeEndedRecord, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

test('several records are signed with one password, and each says its number', async ({ page, signInAs, manager }) => {
  const things = [await makeThings(manager), await makeThings(manager)]
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
})
