import { randomUUID } from 'node:crypto'
import type { Locator, Page } from '@playwright/test'
import { blockSchema, type Block } from '../../shared/contract/block.ts'
import { extentOf } from './support/blockForm.ts'
import type { FarmApi } from './support/demoFarm.ts'
import { expect, test } from './support/test.ts'
import { listBlocks, square } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

/** A square of 79 m by 111 m beside everything, where nothing else is asked: in the west for the desk, in the east for the phone. */
async function makeField(manager: FarmApi, isPhone: boolean): Promise<Block> {
  const { west, east, south } = extentOf(await listBlocks(manager))
  const at = isPhone ? east + 0.0005 : west - 0.0015
  return manager.post('/blocks', { id: randomUUID(), code: unique('M'), name: 'Field', geometry: square({ west: at, south, size: 0.001 }) }, blockSchema)
}

const readBlock = (manager: FarmApi, { id }: Block): Promise<Block> => manager.get(`/blocks/${id}`, blockSchema)
const mapIn = (page: Page, mode: 'edit' | 'draw'): Locator => page.getByRole('application', { name: say(`blocks.map.${mode}Label`) })
const button = (page: Page, words: string): Locator => page.getByRole('button', { name: words, exact: true }).filter({ visible: true })

/** Opens a page of one block's outline, and waits until it has the block, to which the map then goes. */
async function openShape(page: Page, block: Block, path: string): Promise<void> {
  await page.goto(`/blocks/${block.id}/${path}`)
  await expect(page.getByText(new RegExp(`^${block.code}( reshape)?:`)).first()).toBeAttached()
}

async function press(page: Page, key: string, times: number): Promise<void> {
  for (let pressed = 0; pressed < times; pressed += 1) await page.keyboard.press(key)
}

/** Drags a handle by pixels: with a finger where there is one, else with the mouse. */
async function dragHandle(page: Page, handle: Locator, [dx, dy]: readonly [number, number], withFinger: boolean): Promise<void> {
  const box = await handle.boundingBox()
  const [x, y] = [(box?.x ?? 0) + (box?.width ?? 0) / 2, (box?.y ?? 0) + (box?.height ?? 0) / 2]
  const steps = [0.2, 0.6, 1].map((share) => [x + dx * share, y + dy * share] as const)
  if (!withFinger) {
    await page.mouse.move(x, y)
    await page.mouse.down()
    for (const [toX, toY] of steps) await page.mouse.move(toX, toY)
    await page.mouse.up()
    return
  }
  const finger = await page.context().newCDPSession(page)
  await finger.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: [{ x, y }] })
  for (const [toX, toY] of steps) await finger.send('Input.dispatchTouchEvent', { type: 'touchMove', touchPoints: [{ x: toX, y: toY }] })
  await finger.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] })
}

test('reshapes a block by hand, keeps it through a reload, and saves a new version', async ({ page, isPhone, signInAs, manager }) => {
  const block = await makeField(manager, isPhone)
  await signInAs('manager')
  await openShape(page, block, 'shape')
  const handles = page.locator('.map-grip.is-corner')
  await expect(handles).toHaveCount(4)
  const size = await handles.first().boundingBox()
  expect(size?.width ?? 0).toBeGreaterThanOrEqual(isPhone ? 44 : 20)
  const before = await handles.nth(1).boundingBox()
  await dragHandle(page, handles.nth(0), [-30, 24], isPhone)
  // The corner went with the hand and the map did not.
  const after = await handles.nth(1).boundingBox()
  expect([after?.x, after?.y]).toEqual([before?.x, before?.y])
  await dragHandle(page, page.locator('.map-grip.is-middle').first(), [0, 30], isPhone)
  await expect(handles).toHaveCount(5)
  await button(page, say('shapes.reshape.undo')).click()
  await expect(handles).toHaveCount(4)

  await page.reload()
  await expect(page.getByText(say('shapes.reshape.resumed'))).toBeAttached()
  await button(page, say('shapes.reshape.save')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  const saved = await readBlock(manager, block)
  expect(saved.version).toBe(2)
  expect(saved.areaM2).toBeGreaterThan(block.areaM2 * 1.02)
})

test('moves a corner and cuts a hole by keyboard alone', async ({ page, isPhone, signInAs, manager }) => {
  const block = await makeField(manager, isPhone)
  await signInAs('manager')
  await openShape(page, block, 'shape')
  await mapIn(page, 'edit').focus()
  await page.keyboard.press('n')
  await page.keyboard.press('Space')
  await press(page, 'Shift+ArrowLeft', 2)
  await page.keyboard.press('Space')
  await expect(page.getByText(say('shapes.said.dropped'))).toBeAttached()
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  const moved = await readBlock(manager, block)
  // A triangle of 20 m by the 111 m of the side.
  expect(moved.areaM2 - block.areaM2).toBeGreaterThan(1_050)
  expect(moved.areaM2 - block.areaM2).toBeLessThan(1_170)

  await openShape(page, block, 'shape?tool=hole')
  await mapIn(page, 'draw').focus()
  await page.keyboard.press('Space')
  await press(page, 'Shift+ArrowRight', 1)
  await page.keyboard.press('Space')
  await press(page, 'Shift+ArrowUp', 1)
  await page.keyboard.press('Space')
  await page.keyboard.press('Enter')
  await expect(mapIn(page, 'edit')).toBeVisible()
  await expect(page.locator('.map-grip.is-corner')).toHaveCount(7)
  await button(page, say('shapes.reshape.save')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  const cut = await readBlock(manager, block)
  expect(cut.geometry.coordinates).toHaveLength(2)
  expect(moved.areaM2 - cut.areaM2).toBeCloseTo(50, 0)
  expect(cut.version).toBe(3)
})

test('splits a block by a line, undoes it, splits again, and merges the parts back', async ({ page, isPhone, signInAs, manager }) => {
  const block = await makeField(manager, isPhone)
  await signInAs('manager')
  await splitAcross(page, block)
  await button(page, say('shapes.undo')).click()
  await expect(page).toHaveURL(new RegExp(`/blocks/${block.id}$`))
  expect((await readBlock(manager, block)).endedOn).toBeNull()

  await splitAcross(page, block)
  const parts = (await listBlocks(manager)).filter(({ fromIds }) => fromIds.includes(block.id))
  expect(parts.map(({ code }) => code).sort()).toEqual([`${block.code}a`, `${block.code}b`])
  expect(Math.abs(parts.reduce((sum, { areaM2 }) => sum + areaM2, 0) / block.areaM2 - 1)).toBeLessThan(1e-6)

  const [first, second] = parts
  await page.goto(`/blocks/merge?with=${first?.id ?? ''}`)
  await page.getByRole('checkbox', { name: new RegExp(`^${second?.code ?? ''},`) }).check()
  await button(page, say('shapes.merge.save')).click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  const merged = (await listBlocks(manager)).find(({ fromIds }) => fromIds.includes(first?.id ?? ''))
  expect(Math.abs((merged?.areaM2 ?? 0) / block.areaM2 - 1)).toBeLessThan(1e-6)
  expect(merged?.geometry.coordinates[0]).toHaveLength(5)

  await button(page, say('shapes.undo')).click()
  await expect(page).toHaveURL(/\/blocks$/)
  const open = (await listBlocks(manager)).map(({ id }) => id)
  expect(open).toEqual(expect.arrayContaining(parts.map(({ id }) => id)))
  expect(open).not.toContain(merged?.id)
})

/** From the middle of the map, which is the block's own, a line from west of it to east of it. */
async function splitAcross(page: Page, block: Block): Promise<void> {
  await openShape(page, block, 'split')
  await mapIn(page, 'draw').focus()
  await press(page, 'Shift+ArrowLeft', 6)
  await page.keyboard.press('Space')
  await press(page, 'Shift+ArrowRight', 12)
  await page.keyboard.press('Space')
  await expect(page.getByText(`${block.code}: 2 pieces`).first()).toBeAttached()
  await button(page, say('shapes.split.save')).click()
  await expect(page).toHaveURL(/\/blocks$/)
}
