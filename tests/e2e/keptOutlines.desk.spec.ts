import { randomUUID } from 'node:crypto'
import type { Locator, Page } from '@playwright/test'
import { blockSchema } from '../../shared/contract/block.ts'
import { blocksImportedSchema } from '../../shared/contract/blockImport.ts'
import { field, segment } from './support/controls.ts'
import { farmApi } from './support/demoFarm.ts'
import { openNewFarm } from './support/importForm.ts'
import { makeField, openOwnFarm, ownPlace, twiceAsWide } from './support/ownFarm.ts'
import { expect, test } from './support/test.ts'
import { square } from './support/things.ts'
import { say } from './support/words.ts'

const button = (page: Page, words: string): Locator => page.getByRole('button', { name: words, exact: true }).filter({ visible: true })

test('an outline that somebody else changed meanwhile is shown beside one’s own, and one of them is chosen', async ({ page, context }) => {
  const farm = await openOwnFarm(context)
  const place = ownPlace()
  const { west, south, size } = place
  const block = await makeField(farm, 'C', place)
  await page.goto(`/blocks/${block.id}/shape?tool=points`)
  const points = field(page, say('blocks.points.label'))
  await expect(points).not.toHaveValue('')
  await points.fill(twiceAsWide(place))
  await expect(page.getByText(/^C reshape: 1\.76\s+ha/).first()).toBeAttached()
  const theirs = await farm.patch(`/blocks/${block.id}`, { revision: block.revision, geometry: square({ west, south, size: size / 2 }) }, blockSchema)

  await button(page, say('shapes.reshape.save')).click()
  await expect(page.getByText(say('shapes.conflict.title', { code: 'C' }))).toBeVisible()
  await expect(button(page, 'Theirs, version 2: 0.22 ha')).toBeVisible()
  await button(page, say('shapes.reshape.save')).click()
  await expect(page.getByRole('alert').filter({ hasText: say('shapes.conflict.choose') })).toBeVisible()
  expect((await farm.get(`/blocks/${block.id}`, blockSchema)).areaM2).toBe(theirs.areaM2)

  await page.reload()
  await button(page, 'Yours: 1.76 ha').click()
  await button(page, say('shapes.reshape.save')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  const saved = await farm.get(`/blocks/${block.id}`, blockSchema)
  expect([saved.version, Math.round(saved.areaM2 / block.areaM2)]).toEqual([3, 2])
})

test('a cut, a join and a site being written are there after a reload', async ({ page, context }) => {
  const farm = await openOwnFarm(context)
  const place = ownPlace()
  const { west, south, size } = place
  const block = await makeField(farm, 'K', place)
  await makeField(farm, 'L', square({ west: west + size, south, size }))
  const begun = page.getByText(say('shapes.begun'))

  await page.goto(`/blocks/${block.id}/split`)
  await segment(page, say('shapes.split.byShare'))
  await field(page, say('shapes.split.share')).fill('30')
  await field(page, say('blocks.form.code')).first().fill('K1')
  await page.reload()
  await expect(begun).toBeVisible()
  await expect(field(page, say('shapes.split.share'))).toHaveValue('30')
  await expect(field(page, say('blocks.form.code')).first()).toHaveValue('K1')

  await page.goto(`/blocks/merge?with=${block.id}`)
  await page.getByRole('checkbox', { name: /^L,/ }).check()
  await field(page, say('blocks.form.name')).fill('Both of them')
  await page.reload()
  await expect(begun).toBeVisible()
  await expect(page.getByRole('checkbox', { name: /^L,/ })).toBeChecked()
  await expect(field(page, say('blocks.form.name'))).toHaveValue('Both of them')
  await page.getByRole('button', { name: say('shapes.beginAnew') }).click()
  await expect(page.getByRole('checkbox', { name: /^L,/ })).not.toBeChecked()

  await page.goto('/blocks/ground/new?what=site')
  await field(page, say('ground.form.name')).fill('Spring')
  await segment(page, say('blocks.draw.byPoints'))
  await field(page, say('blocks.points.label')).fill('44.6010000, -123.3010000')
  await page.reload()
  await expect(begun).toBeVisible()
  await expect(field(page, say('ground.form.name'))).toHaveValue('Spring')
  await expect(field(page, say('blocks.points.label'))).toHaveValue('44.6010000, -123.3010000')
})

test('of a long list of blocks only the rows in sight are drawn, and the keys walk all of them', async ({ page, context }) => {
  const farm = farmApi(context.request, await openNewFarm(context))
  const { west, south, size } = ownPlace()
  const blocks = Array.from({ length: 400 }, (_, index) => ({
    id: randomUUID(), code: `B${String(index + 1).padStart(3, '0')}`, name: 'One of many', geometry: square({ west: west + (index % 20) * 0.0011, south: south + Math.floor(index / 20) * 0.0011, size }),
  }))
  await farm.post('/blocks/import', { blocks }, blocksImportedSchema)
  await page.goto('/blocks')
  const list = page.getByRole('table', { name: say('blocks.list.caption') })
  await expect(list).toHaveAttribute('aria-rowcount', '402')
  expect(await list.locator('[data-row]').count()).toBeLessThan(100)
  const rowOf = (code: string): Locator => list.locator('[data-row]').filter({ hasText: code })
  await page.keyboard.press('k')
  await expect(rowOf('B400').getByRole('link')).toBeFocused()
  await expect(rowOf('B400')).toBeInViewport()
  await expect(rowOf('B400')).toHaveAttribute('aria-rowindex', '401')
  expect(await list.locator('[data-row]').count()).toBeLessThan(100)
  await page.keyboard.press('k')
  await expect(rowOf('B399').getByRole('link')).toBeFocused()
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(new RegExp(`/blocks/${blocks[398]?.id ?? ''}$`))
})
