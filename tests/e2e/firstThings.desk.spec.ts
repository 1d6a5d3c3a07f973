import { BlockForm, extentOf, typedPoints } from './support/blockForm.ts'
import { choose, field, segment } from './support/controls.ts'
import { expect, test } from './support/test.ts'
import { listBlocks } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

/** What the page says of an outline of four corners; area in hectares, perimeter in metres. */
function figuresOf({ area, perimeter }: { area: string; perimeter: string }): string {
  return say('blocks.draw.figures', { area: `${area} ha`, perimeter: `${perimeter} m`, points: 4 })
}

test('draws a block by keyboard, with its live area, and saves it', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const form = new BlockForm(page)
  const { south, north } = extentOf(await listBlocks(manager))
  await form.open('draw')
  await form.map.focus()
  // From the middle of the map past the northernmost block: 111 320 m a degree, 10 m a press.
  await form.step('ArrowUp', Math.ceil(((north - south) * 111_320 * 0.75) / 10))
  await page.keyboard.press('Space')
  for (const arrow of ['ArrowRight', 'ArrowUp', 'ArrowLeft'] as const) {
    await form.step(arrow, 5)
    await page.keyboard.press('Space')
  }
  const figures = form.main.getByText(figuresOf({ area: '0.25', perimeter: '200' })).filter({ visible: true })
  await expect(figures.first()).toBeVisible()
  await page.keyboard.press('Enter')
  await expect(form.main.getByText(say('blocks.draw.finished')).or(field(form.main, say('blocks.form.code')))).not.toHaveCount(0)
  const code = unique('K')
  await form.name(code)
  await expect(page.getByRole('complementary', { name: say('frame.checks') }).getByText('0.25 ha')).toBeVisible()
  await form.saveButton.click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
  const saved = (await listBlocks(manager)).find((block) => block.code === code)
  expect(saved?.areaM2).toBeGreaterThan(2490)
  expect(saved?.areaM2).toBeLessThan(2510)
})

test('types the points of a block, with its live area, and saves it', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const form = new BlockForm(page)
  const { west, south } = extentOf(await listBlocks(manager))
  await form.open('points')
  const [left, top] = [west, south - 0.0003]
  await form.points.fill(typedPoints([[left, top], [left + 0.001, top], [left + 0.001, top - 0.0005], [left, top - 0.0005]]))
  // 0.001° by 0.0005° at 44.6° N: 79.4 m by 55.6 m.
  await expect(form.main.getByText(figuresOf({ area: '0.44', perimeter: '270' })).filter({ visible: true }).first()).toBeVisible()
  const code = unique('P')
  await form.name(code)
  await form.saveButton.click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  await expect(page.getByRole('heading', { name: code })).toBeVisible()
})

test('takes a material and receives a lot of it', async ({ page, signInAs }) => {
  await signInAs('manager')
  await page.goto('/inputs')
  const [material, lot] = [unique('Nettle '), unique('N-')]
  await page.getByRole('button', { name: say('inputs.newMaterial') }).click()
  const writing = page.getByRole('dialog', { name: say('inputs.form.materialTitle') })
  await field(writing, say('inputs.form.name')).fill(material)
  await choose(writing, say('inputs.form.kind'), say('inputs.kind.ferment'))
  await segment(writing, say('inputs.measure.volume'))
  await segment(writing, say('inputs.status.allowed'))
  await field(writing, say('inputs.form.basis')).fill('System plan, line 3')
  await writing.getByRole('button', { name: say('inputs.form.materialSave') }).click()
  await expect(writing).toBeHidden()
  const row = page.getByRole('row').filter({ hasText: material })
  await row.getByRole('button', { name: say('inputs.receiveLot') }).click()
  const receiving = page.getByRole('dialog', { name: say('inputs.form.lotTitle') })
  await field(receiving, say('inputs.form.code')).fill(lot)
  await field(receiving, say('inputs.form.quantity')).fill('40')
  await segment(receiving, say('inputs.origin.made'))
  await receiving.getByRole('button', { name: say('inputs.form.lotSave') }).click()
  await expect(receiving).toBeHidden()
  await expect(page.getByRole('row').filter({ hasText: lot })).toContainText('40 L')
})
