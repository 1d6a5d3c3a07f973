import type { Locator, Page } from '@playwright/test'
import { PASSWORD } from './support/demoFarm.ts'
import { field } from './support/controls.ts'
import { expect, test } from './support/test.ts'
import { listLots, makeSignedRecord, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

const press = (place: Page | Locator, name: string): Promise<void> => place.getByRole('button', { name, exact: true }).click()

test('a slip is amended with its reason, and both versions stand side by side', async ({ page, signInAs, manager }) => {
  const things = await makeThings(manager)
  const record = await makeSignedRecord(manager, things)
  await signInAs('manager')
  await page.goto(`/register/${record.id}`)
  await press(page, say('versions.act.amend'))
  await expect(page).toHaveURL(new RegExp(`/register/${record.id}/amend$`))
  const main = page.getByRole('main')
  await field(main, say('versions.amend.reason')).fill('The weather was noted on paper and left out')
  await field(main, say('records.plain.notes.label')).fill('Overcast, a little dew')
  await page.reload()
  await expect(field(main, say('versions.amend.reason'))).toHaveValue('The weather was noted on paper and left out')
  await expect(field(main, say('records.plain.notes.label'))).toHaveValue('Overcast, a little dew')
  await field(main, say('records.sign.password')).fill('not the password')
  await press(main, say('versions.amend.sign'))
  await expect(main.getByRole('alert').filter({ hasText: say('records.sign.wrongPassword') })).toBeVisible()
  await field(main, say('records.sign.password')).fill(PASSWORD)
  await press(main, say('versions.amend.sign'))
  await expect(page).toHaveURL(new RegExp(`/register/${record.id}$`))
  await expect(page.getByText(say('versions.amendedNotice', { version: 2 }))).toBeVisible()
  const changed = page.getByRole('row', { name: new RegExp(say('records.plain.notes.label')) })
  await expect(changed).toContainText(say('versions.notSaid'))
  await expect(changed).toContainText('Overcast, a little dew')
  await expect(page.getByRole('row').filter({ hasText: say('versions.changed') })).toHaveCount(1)
  await expect(page.getByRole('link', { name: say('versions.pdf', { version: 1 }) })).toHaveAttribute('href', /pdf\?version=1$/)
})

test('a double is withdrawn: a line through it, and its lot whole again', async ({ page, signInAs, manager }) => {
  const things = await makeThings(manager)
  const record = await makeSignedRecord(manager, things)
  await signInAs('manager')
  await page.goto(`/register/${record.id}`)
  await press(page, say('versions.act.withdraw'))
  const dialog = page.getByRole('dialog')
  await press(dialog, say('versions.act.withdrawSave'))
  await expect(dialog.getByText(say('versions.act.needReason'), { exact: true })).toBeVisible()
  await field(dialog, say('versions.act.withdrawReason')).fill('Written down twice')
  await field(dialog, say('records.sign.password')).fill(PASSWORD)
  await press(dialog, say('versions.act.withdrawSave'))
  await expect(page.getByText(say('versions.withdrawnNotice'))).toBeVisible()
  await expect(page.getByText(say('versions.becauseOf', { reason: 'Written down twice' })).first()).toBeVisible()
  await expect(page.getByRole('button', { name: say('versions.act.amend') })).toHaveCount(0)
  const [lot] = await listLots(manager, things.first.material.id)
  expect(Number(lot?.left.value)).toBe(100)
})

test('a manager marks what stands as reviewed', async ({ page, signInAs, manager }) => {
  const record = await makeSignedRecord(manager, await makeThings(manager))
  await signInAs('manager')
  await page.goto(`/register/${record.id}`)
  await press(page, say('versions.act.review'))
  await field(page.getByRole('dialog'), say('versions.act.reviewReason')).fill('Agrees with the tank book')
  await press(page.getByRole('dialog'), say('versions.act.reviewSave'))
  await expect(page.getByText(/Agrees with the tank book/)).toBeVisible()
  await expect(page.getByRole('button', { name: say('versions.act.review') })).toHaveCount(0)
})
