import { field } from './support/controls.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

test.use({ readsAhead: true })

test('Back closes what lies over the page and leaves the page where it is', async ({ page, signInAs }) => {
  await signInAs('manager')
  await openScreen(page, '/blocks')
  await openScreen(page, '/inputs')
  const dialog = page.getByRole('dialog')
  const open = async (): Promise<void> => {
    await page.getByRole('button', { name: say('inputs.newMaterial') }).click()
    await expect(dialog).toBeVisible()
  }
  await open()
  await page.goBack()
  await expect(dialog).toBeHidden()
  await expect(page).toHaveURL(/\/inputs$/)
  // Closed by its own button it leaves nothing behind that Back would have to take away.
  await open()
  await dialog.getByRole('button', { name: say('inputs.cancel') }).click()
  await expect(dialog).toBeHidden()
  await page.getByRole('button', { name: say('frame.more'), exact: true }).click()
  await dialog.getByRole('link', { name: say('frame.places.farm') }).click()
  await expect(page).toHaveURL(/\/farm$/)
  await expect(dialog).toBeHidden()
  await page.goBack()
  await expect(page).toHaveURL(/\/inputs$/)
  await page.goBack()
  await expect(page).toHaveURL(/\/blocks$/)
})

test('a double tap saves once', async ({ page, signInAs }) => {
  await signInAs('manager')
  await openScreen(page, '/farm/sprayers')
  const code = unique('T')
  await page.getByRole('button', { name: say('farm.addSprayer') }).click()
  const dialog = page.getByRole('dialog', { name: say('farm.addSprayer') })
  for (const [label, words] of [['farm.sprayerCode', code], ['farm.sprayerName', 'Tapped twice'], ['farm.tank', '100']] as const) {
    await field(dialog, say(label)).fill(words)
  }
  let sent = 0
  page.on('request', (request) => { if (request.method() === 'POST' && request.url().endsWith('/sprayers')) sent += 1 })
  await dialog.getByRole('button', { name: say('farm.saveSprayer') }).dblclick()
  await expect(dialog).toBeHidden()
  await expect(page.getByText(code, { exact: true }).filter({ visible: true })).toHaveCount(1)
  expect(sent).toBe(1)
})

test('the e-mail waits to be written on the cover, and a lack of signal is said only while there is none', async ({ page, context }) => {
  await openScreen(page, '/signin')
  await expect(field(page, say('session.email'))).toBeFocused()
  await page.keyboard.type('manager@demo.test')
  await page.getByLabel(say('session.password'), { exact: true }).fill('not the password')
  await context.setOffline(true)
  await page.getByRole('button', { name: say('session.openRegister') }).click()
  await expect(page.getByText(say('common.noAnswer'))).toBeVisible()
  await context.setOffline(false)
  await expect(page.getByText(say('common.noAnswer'))).toBeHidden()
})

test('every page says that there is no signal, and stops saying it', async ({ page, context, signInAs }) => {
  await signInAs('manager')
  await openScreen(page, '/register/new')
  const badge = page.getByRole('button', { name: say('frame.sync.noSignalNone') })
  await context.setOffline(true)
  await expect(badge).toBeVisible()
  await context.setOffline(false)
  await expect(badge).toBeHidden()
})
