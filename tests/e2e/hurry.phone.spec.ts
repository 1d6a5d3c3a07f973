import { randomUUID } from 'node:crypto'
import type { Page } from '@playwright/test'
import { pageOf } from '../../shared/contract/common.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { BlockForm, extentOf, typedPoints } from './support/blockForm.ts'
import { field } from './support/controls.ts'
import { emailOf, OURS, PASSWORD } from './support/demoFarm.ts'
import { RecordForm } from './support/recordForm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { listBlocks, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say, saying } from './support/words.ts'

test.use({ readsAhead: true })

/** Points of a piece south of everything drawn. */
async function freePoints(manager: Parameters<typeof listBlocks>[0]): Promise<string> {
  const { west, south } = extentOf(await listBlocks(manager))
  const top = south - 0.0003
  return typedPoints([[west, top], [west + 0.001, top], [west + 0.001, top - 0.0004], [west, top - 0.0004]])
}

const badgeOf = (page: Page, words: string | RegExp) => page.getByRole('button', { name: words }).filter({ visible: true })

test('three presses on Save make one block', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const form = new BlockForm(page)
  await form.open('points')
  await form.points.fill(await freePoints(manager))
  const code = unique('H')
  await form.name(code)
  await form.saveButton.click({ clickCount: 3 })
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  expect((await listBlocks(manager)).filter((block) => block.code === code)).toHaveLength(1)
})

test('three presses on Start and on Sign make one record', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await expect(form.startButton).toBeEnabled()
  await form.startButton.click({ clickCount: 3 })
  await expect(form.step(2)).toHaveAttribute('aria-current', 'step')
  await form.endNow()
  await form.password.fill(PASSWORD)
  await form.signButton.click({ clickCount: 3 })
  const number = await form.signedNumber()
  const { items } = await manager.get(`/records?limit=200&block=${things.block.id}`, pageOf(registerRowSchema))
  expect(items.map((row) => row.number)).toEqual([number])
})

test('the back button keeps the draft', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  await openScreen(page, '/register')
  await page.getByRole('button', { name: say('register.newRecord') }).click()
  const form = new RecordForm(page, isPhone)
  await form.fillDrench(things)
  await page.goBack()
  await expect(page).toHaveURL(/\/register$/)
  await page.getByRole('link', { name: new RegExp(things.block.code) }).first().click()
  await expect(page).toHaveURL(/\/register\/new\?draft=/)
  await expect(form.mixLine(things.first.material.name)).toBeVisible()
  await expect(form.startButton).toBeEnabled()
  // An address of a draft that is nowhere opens no empty form.
  await page.goto(`/register/new?draft=${randomUUID()}`)
  await expect(page.getByText(say('draftElsewhere.notHere.title'))).toBeVisible()
  await expect(form.startButton).toHaveCount(0)
})

test('without signal a draft stays, a block is kept, and both go on when the signal is back', async ({ page, context, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const blockForm = new BlockForm(page)
  const recordForm = new RecordForm(page, isPhone)
  const points = await freePoints(manager)
  await openScreen(page, '/blocks')
  await page.getByRole('button', { name: say('blocks.draw.link'), exact: true }).click()
  await page.getByRole('button', { name: say('blocks.draw.byPoints') }).click()
  await expect(blockForm.points).toBeVisible()
  await context.setOffline(true)
  await blockForm.points.fill(points)
  const code = unique('F')
  await blockForm.name(code)
  await blockForm.saveButton.click()
  await expect(page).toHaveURL(/\/blocks$/)
  await badgeOf(page, saying('frame.sync.noSignal')).click()
  await expect(page.getByRole('dialog', { name: say('frame.kept.title') }).getByText(code)).toBeVisible()
  await page.keyboard.press('Escape')
  expect((await listBlocks(manager)).some((block) => block.code === code)).toBe(false)

  await context.setOffline(false)
  await expect(badgeOf(page, new RegExp(`^${say('frame.sync.allSent')}`))).toBeVisible()
  await expect.poll(async () => (await listBlocks(manager)).filter((block) => block.code === code).length).toBe(1)

  await recordForm.open()
  await page.waitForLoadState('networkidle')
  await context.setOffline(true)
  await recordForm.fillDrench(things)
  await context.setOffline(false)
  await page.reload()
  await expect(recordForm.mixLine(things.first.material.name)).toBeVisible()
})

test('a session that ends in the middle asks for the password and loses nothing', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  const ended = await page.request.delete('/api/session', { headers: OURS })
  expect(ended.ok()).toBe(true)
  await form.startButton.click()
  const dialog = page.getByRole('dialog', { name: say('session.reentry.title') })
  await expect(dialog).toBeVisible()
  await field(dialog, say('session.reentry.passwordOf', { email: emailOf('manager') })).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('session.reentry.goOn') }).click()
  await expect(dialog).toBeHidden()
  await expect(form.step(2)).toHaveAttribute('aria-current', 'step')
  await form.endNow()
  await form.sign()
  expect(await form.signedNumber()).toMatch(/^\d{4}-\d{4}$/)
})

test('figures that are none are said at their field; one and a half is read either way', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await form.setWater('200')
  const water = field(form.main, say('records.mix.carrierAmount'))
  for (const bad of ['12abc', '-5', '1e3']) {
    await water.fill(bad)
    await expect(water).toHaveAccessibleDescription(new RegExp(say('records.gap.number').replace('.', '\\.')))
    await expect(water).toHaveAttribute('aria-invalid', 'true')
    await expect(form.startButton).toBeDisabled()
  }
  for (const good of ['1,5', '1½', '1 200']) {
    await water.fill(good)
    await expect(water).not.toHaveAttribute('aria-invalid', 'true')
    await expect(form.mixLine(say('records.mix.carrier')).filter({ hasText: /L/ }).first()).toBeVisible()
    await expect(form.startButton).toBeEnabled()
  }
})
