import type { Locator, Page } from '@playwright/test'
import { blockSchema, type Block, type Boundary } from '../../shared/contract/block.ts'
import { readText } from '../support/readPdf.ts'
import { choose, field, segment } from './support/controls.ts'
import { OURS } from './support/demoFarm.ts'
import { makeField, openOwnFarm, ownPlace, twiceAsWide } from './support/ownFarm.ts'
import { expect, test } from './support/test.ts'
import { listBlocks, makeSignedRecord, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

const button = (page: Page, words: string): Locator => page.getByRole('button', { name: words, exact: true }).filter({ visible: true })
const cornersOf = ({ geometry }: Block): string[] => (geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates.flat()).flat().map(String)

test('an outline drawn a hand short of its neighbour takes the neighbour’s corners, and no sliver stays', async ({ page, context }) => {
  const farm = await openOwnFarm(context)
  const place = ownPlace()
  const { west, south, size } = place
  const there = await makeField(farm, 'W', place)
  // 0.7 m short in the west, and 0.5 m and 0.3 m off along it.
  const short: Boundary = { type: 'Polygon', coordinates: [[
    [west + size + 0.000009, south + 0.0000045], [west + 2 * size, south], [west + 2 * size, south + size], [west + size + 0.000009, south + size - 0.0000027], [west + size + 0.000009, south + 0.0000045],
  ]] }
  const block = await makeField(farm, 'E', short)
  await page.goto(`/blocks/${block.id}/shape?tool=snap`)
  const reach = field(page, say('shapes.snap.reach'))
  await reach.fill('0.2')
  await button(page, say('shapes.snap.act')).click()
  await expect(page.getByText(say('shapes.snap.none'))).toBeVisible()
  await reach.fill('2')
  await button(page, say('shapes.snap.act')).click()
  await expect(page.getByText('2 corners moved or set.')).toBeVisible()
  await button(page, say('shapes.reshape.save')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  const saved = await farm.get(`/blocks/${block.id}`, blockSchema)
  const shared = new Set(cornersOf(saved).filter((corner) => cornersOf(there).includes(corner)))
  expect(shared.size).toBe(2)
  expect(saved.version).toBe(2)
})

test('a block is split by a share, undone, split between two corners, and merged back', async ({ page, context }) => {
  const farm = await openOwnFarm(context)
  const place = ownPlace()
  const block = await makeField(farm, 'S', place)
  const parts = async (): Promise<Block[]> => (await listBlocks(farm)).filter(({ fromIds }) => fromIds.includes(block.id))
  await page.goto(`/blocks/${block.id}/split`)
  await segment(page, say('shapes.split.byShare'))
  await field(page, say('shapes.split.share')).fill('0')
  await expect(page.getByText(say('shapes.split.shareWrong')).first()).toBeVisible()
  await field(page, say('shapes.split.share')).fill('25')
  await expect(page.getByText('S: 2 pieces').first()).toBeAttached()
  await button(page, say('shapes.split.save')).click()
  await expect(page).toHaveURL(/\/blocks$/)
  const shares = (await parts()).map(({ areaM2 }) => areaM2 / block.areaM2).sort()
  expect(shares[0]).toBeCloseTo(0.25, 4)
  expect(Math.abs(shares.reduce((sum, share) => sum + share, 0) - 1)).toBeLessThan(1e-6)
  await button(page, say('shapes.undo')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  expect(await parts()).toEqual([])

  await page.goto(`/blocks/${block.id}/split`)
  await segment(page, say('shapes.split.byCorners'))
  await choose(page, say('shapes.split.from'), say('shapes.corners.choose', { number: 2 }))
  await choose(page, say('shapes.split.to'), say('shapes.corners.choose', { number: 4 }))
  await expect(page.getByText('S: 2 pieces').first()).toBeAttached()
  await button(page, say('shapes.split.save')).click()
  await expect(page).toHaveURL(/\/blocks$/)
  const [first, second] = await parts()
  expect([first, second].map((part) => part?.geometry.coordinates[0]?.length)).toEqual([4, 4])

  await page.goto(`/blocks/merge?with=${first?.id ?? ''}`)
  await page.getByRole('checkbox', { name: new RegExp(`^${second?.code ?? ''},`) }).check()
  await button(page, say('shapes.merge.save')).click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  const merged = (await listBlocks(farm)).find(({ fromIds }) => fromIds.includes(first?.id ?? ''))
  expect(merged?.areaM2).toBe(block.areaM2)
  expect(new Set(merged && cornersOf(merged))).toEqual(new Set(cornersOf(block)))
})

test('a record signed before the boundary changed still prints the old one', async ({ page, context }) => {
  const farm = await openOwnFarm(context)
  const place = ownPlace()
  const things = await makeThings(farm)
  const block = await makeField(farm, 'R', place)
  const record = await makeSignedRecord(farm, { ...things, block })
  const print = async (id: string): Promise<string> => {
    const answer = await context.request.get(`/api/farms/${farm.farmId}/records/${id}/pdf`, { headers: OURS })
    expect(answer.status()).toBe(200)
    return readText(await answer.body())
  }
  /** The outline as printed: its area, its version, and the scale at which it fills its frame. */
  const outlineIn = (text: string): (string | undefined)[] => [/R version \d+/, /0\.88|1\.76/, /1 : [\d\s\u00A0]+ at this size/].map((words) => words.exec(text)?.[0])
  const before = outlineIn(await print(record.id))
  expect(before[1]).toBe('0.88')

  await page.goto(`/blocks/${block.id}/shape?tool=points`)
  await field(page, say('blocks.points.label')).fill(twiceAsWide(place))
  await button(page, say('shapes.reshape.save')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  await button(page, '2 boundaries').click()
  await expect(page.getByRole('dialog').getByText(say('growing.boundaries.difference')).first()).toBeVisible()
  expect(outlineIn(await print(record.id))).toEqual(before)

  const changed = await farm.get(`/blocks/${block.id}`, blockSchema)
  const after = outlineIn(await print((await makeSignedRecord(farm, { ...things, block: changed })).id))
  expect(after[1]).toBe('1.76')
  expect(after[0]).not.toBe(before[0])
  expect(after[2]).not.toBe(before[2])
})
