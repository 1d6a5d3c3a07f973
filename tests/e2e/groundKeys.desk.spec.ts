import { pageOf } from '../../shared/contract/common.ts'
import { groundSchema } from '../../shared/contract/ground.ts'
import { choose, field } from './support/controls.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

test('draws a hedge by keyboard alone, and finds it on map and list after a reload', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const name = unique('Hedge ')
  await page.goto('/blocks/ground')
  await page.getByRole('button', { name: say('ground.add.ground') }).press('Enter')
  const main = page.getByRole('main', { name: say('ground.form.newGround') })
  await choose(main, say('ground.form.kind'), say('ground.groundKind.hedge'))
  await field(main, say('ground.form.nameOptional')).fill(name)
  await field(main, say('ground.form.width')).fill('2')
  await main.getByRole('button', { name: say('blocks.draw.toMap') }).press('Enter')
  const map = page.getByRole('application', { name: say('ground.map.drawLabel') })
  await expect(map).toBeFocused()
  await expect(map.locator('.map-cross')).toBeAttached()
  await page.keyboard.press('Space')
  for (let tens = 0; tens < 6; tens += 1) await page.keyboard.press('Shift+ArrowRight')
  await page.keyboard.press('Space')
  await expect(main.getByRole('status').getByText('60 m')).toBeVisible()
  await main.getByRole('button', { name: say('ground.form.save'), exact: true }).press('Enter')

  const list = page.getByRole('table', { name: say('ground.list.groundCaption') })
  await expect(list.getByRole('row', { name: name })).toContainText('2')
  const hedges = page.locator('path.ground-hedge')
  await expect(hedges.first()).toBeAttached()
  const drawn = await hedges.count()
  await page.reload()
  await expect(list.getByRole('row', { name: name })).toBeVisible()
  await expect(hedges).toHaveCount(drawn)
  const { items } = await manager.get('/ground?limit=200', pageOf(groundSchema))
  expect(items.find((feature) => feature.name === name)).toMatchObject({ kind: 'hedge', widthM: '2', geometry: { type: 'LineString' } })
})
