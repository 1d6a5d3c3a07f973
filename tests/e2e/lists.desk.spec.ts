import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { say } from './support/words.ts'

test('Escape closes an open list, then the dialog around it', async ({ page, signInAs }) => {
  await signInAs('manager')
  await openScreen(page, '/inputs')
  await page.getByRole('button', { name: say('inputs.newMaterial') }).click()
  const dialog = page.getByRole('dialog', { name: say('inputs.form.materialTitle') })
  const list = dialog.getByRole('combobox', { name: say('inputs.form.kind'), exact: true })
  await list.focus()
  await page.keyboard.press('Enter')
  await expect(list).toHaveAttribute('aria-expanded', 'true')
  const rings = await list.evaluate((box) => [box, box.closest('.el-select__wrapper') ?? box].filter((each) => {
    const { outlineStyle, boxShadow } = getComputedStyle(each)
    return outlineStyle !== 'none' || boxShadow !== 'none'
  }).length)
  expect(rings, 'one ring around the field').toBe(1)
  await page.keyboard.press('Escape')
  await expect(list).toHaveAttribute('aria-expanded', 'false')
  await expect(dialog).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(dialog).toBeHidden()
})
