import { RecordForm } from './support/recordForm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeThings } from './support/things.ts'

/** Least height of what a thumb has to meet, CSS pixels. */
const TARGET_PX = 48

/** Buttons, links and fields in sight where a thumb has less than `least` pixels of height to meet, with their words. */
function smallTargets(least: number): string[] {
  const kinds = 'button, a[href], select, input:not([type="radio"]):not([type="checkbox"]), label.lot, .seg label'
  const isSeen = (element: Element): boolean => {
    const { width, height } = element.getBoundingClientRect()
    return width > 1 && height > 1 && element.closest('[aria-hidden="true"], .visually-hidden, .skip') === null && getComputedStyle(element).visibility === 'visible'
  }
  // What is drawn around a field takes the touch with it.
  const wholeOf = (element: Element): Element => element.closest('.el-input__wrapper, .el-select__wrapper, .inp, .seg') ?? element.closest(kinds) ?? element
  return [...document.querySelectorAll(kinds)].filter(isSeen).flatMap((control) => {
    control.scrollIntoView({ block: 'center' })
    const whole = wholeOf(control)
    const { left, width, top, height } = whole.getBoundingClientRect()
    const isMet = (y: number): boolean => {
      const met = document.elementFromPoint(left + width / 2, y)
      return met !== null && wholeOf(met) === whole
    }
    const middle = top + height / 2
    const reach = (step: 1 | -1): number => { let px = 0; while (px < least && isMet(middle + step * px)) px += 1; return px }
    const met = Math.max(Math.round(height), reach(-1) + reach(1))
    return met < least ? [`${met}px ${control.tagName.toLowerCase()} ${(control.getAttribute('aria-label') ?? control.textContent ?? '').trim().slice(0, 40)}`] : []
  })
}

test('a thumb meets everything of the main flow', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('manager')
  const found: string[] = []
  for (const path of ['/', '/blocks', `/blocks/${things.block.id}`, '/register']) {
    await openScreen(page, path)
    found.push(...(await page.evaluate(smallTargets, TARGET_PX)).map((target) => `${path}: ${target}`))
  }
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  found.push(...(await page.evaluate(smallTargets, TARGET_PX)).map((target) => `ready: ${target}`))
  await form.step(2).click()
  await expect(form.password).toBeVisible()
  found.push(...(await page.evaluate(smallTargets, TARGET_PX)).map((target) => `happened: ${target}`))
  expect([...new Set(found)]).toEqual([])
})
