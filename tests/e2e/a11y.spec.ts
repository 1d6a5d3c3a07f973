import type { Page } from '@playwright/test'
import { findFaults } from './support/axe.ts'
import { findWide } from './support/findWide.ts'
import { RecordForm } from './support/recordForm.ts'
import { listScreens, openScreen, walkScreens } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeThings } from './support/things.ts'
import { watchPages } from './support/watchPage.ts'
import { say } from './support/words.ts'

const DESKS = [{ width: 1440, height: 900 }, { width: 1024, height: 768 }] as const
const PHONES = [{ width: 390, height: 844 }, { width: 320, height: 844 }] as const

async function setLight(page: Page, light: 'day' | 'dawn'): Promise<void> {
  await page.evaluate(async (chosen) => {
    document.documentElement.dataset['light'] = chosen
    // However short, a change of colour takes its frames: until it is over an element shows neither light.
    const nextFrame = (): Promise<unknown> => new Promise((resolve) => { requestAnimationFrame(resolve) })
    await nextFrame()
    while (document.getAnimations().some((animation) => animation instanceof CSSTransition)) await nextFrame()
    await nextFrame()
  }, light)
}

// One walk for all that every screen has to be: each page is opened once.
test('on every screen axe finds nothing, by day and at dawn, none breaks the policy or errs, none is cut off or scrolls sideways', async ({ page, context, isPhone, manager }) => {
  test.slow()
  const [first, ...others] = isPhone ? PHONES : DESKS
  const found = await watchPages(context, { strict: true })
  const titles = new Map<string, string[]>()
  const screens = await listScreens(manager)
  await page.setViewportSize(first)
  await walkScreens(page, screens, async ({ name }) => {
    const title = await page.title()
    titles.set(title, [...titles.get(title) ?? [], name])
    const note = (faults: string[], of: string): void => { for (const fault of faults) found.push(`${name}, ${of}: ${fault}`) }
    note(await findFaults(page), 'day')
    note(await findWide(page), `${first.width}`)
    for (const size of others) {
      await page.setViewportSize(size)
      note(await findWide(page), `${size.width}`)
    }
    await page.setViewportSize(first)
    // A desk has the same colours; at dawn it is a phone that is out.
    if (!isPhone) return
    await setLight(page, 'dawn')
    note(await findFaults(page, 'color-contrast'), 'dawn')
    await setLight(page, 'day')
  })
  expect(found).toEqual([])
  expect([...titles.keys()].filter((title) => !title.endsWith(' – Drenchleaf'))).toEqual([])
  expect([...titles.values()].filter((names) => names.length > 1), 'screens of one page').toEqual([['check a code', 'a code that agrees'], ['draw a block', 'type a block'], ['people of the farm', 'people, to the owner']])
})

test('axe finds nothing in a record being written, nor in the dialogs', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  const found = [...await findFaults(page)]
  await form.checks()
  found.push(...await findFaults(page))
  await form.closeChecks()
  await form.step(2).click()
  await expect(form.password).toBeVisible()
  found.push(...await findFaults(page))
  for (const [path, button, dialog] of [
    ['/inputs', 'inputs.newMaterial', 'inputs.form.materialTitle'], ['/inputs', 'inputs.receiveLot', 'inputs.form.lotTitle'], ['/farm/sprayers', 'farm.addSprayer', 'farm.addSprayer'],
  ] as const) {
    await openScreen(page, path)
    await page.getByRole('main').getByRole('button', { name: say(button) }).first().click()
    await expect(page.getByRole('dialog', { name: say(dialog) })).toBeVisible()
    found.push(...(await findFaults(page)).map((fault) => `${say(dialog)}: ${fault}`))
  }
  expect(found).toEqual([])
})

test('the keyboard goes everywhere: skip link, F6, J, K, Enter, and shows where it is', async ({ page, isPhone, signInAs }) => {
  await signInAs('manager')
  await openScreen(page, '/register')
  await page.keyboard.press('Tab')
  const skip = page.getByRole('link', { name: say('frame.skip') })
  await expect(skip).toBeFocused()
  await expect(skip).toBeInViewport()
  await page.keyboard.press('Enter')
  await expect(page.getByRole('main')).toBeFocused()
  await page.keyboard.press('Tab')
  const ring = await page.evaluate(() => {
    const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(document.activeElement ?? document.body)
    return { outlineStyle, outlineWidth: Number.parseFloat(outlineWidth), boxShadow }
  })
  expect(ring.boxShadow !== 'none' || (ring.outlineStyle !== 'none' && ring.outlineWidth >= 2)).toBe(true)
  const parts = isPhone ? ['spine', 'page'] : ['checks', 'spine', 'page']
  for (const part of parts) {
    await page.keyboard.press('F6')
    await expect(page.locator(`[data-part="${part}"]`)).toBeFocused()
  }
  if (isPhone) return
  const chosen = page.locator('tr[aria-current="true"]')
  const before = await chosen.getAttribute('data-row')
  await page.keyboard.press('j')
  await expect(chosen).not.toHaveAttribute('data-row', before ?? '')
  await page.keyboard.press('k')
  await expect(chosen).toHaveAttribute('data-row', before ?? '')
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(new RegExp(`${before}$`))
})
