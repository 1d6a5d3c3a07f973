import { blockSchema } from '../../shared/contract/block.ts'
import { say } from './support/words.ts'
import { choose, field } from './support/controls.ts'
import { expect, test } from './support/test.ts'
import { makeBlock, makeSignedRecord, makeThings, square } from './support/things.ts'
import { readText } from '../support/readPdf.ts'

/** A quarter of the test's own square, over its south-west corner. */
const QUARTER = square({ west: -123.3126, south: 44.6043, size: 0.00045 })
const OVER = [{ code: 'geometry.overlap', reason: 'made by a test' }, { code: 'geometry.far_from_farm', reason: 'made by a test' }]

test.beforeEach(async ({ context, manager, signInAs }) => {
  await signInAs('manager')
  await context.addInitScript((farmId) => { localStorage.setItem('drenchleaf.farm', farmId) }, manager.farmId)
})

test('a block’s land and planting are written down, and an error stands at its field with what was typed', async ({ page, manager }) => {
  const { id, code } = await makeBlock(manager)
  await page.goto(`/blocks/${id}`)
  await expect(page.getByText(say('growing.notKnown')).first()).toBeVisible()

  await page.getByRole('button', { name: say('growing.land.edit') }).click()
  const land = page.getByRole('dialog', { name: say('growing.land.form', { code }) })
  await land.getByRole('button', { name: say('growing.land.save') }).click()
  await expect(land.getByText(say('problems.field.choose'))).toBeVisible()
  await choose(land, say('growing.land.status'), say('growing.land.statusOf.transition'))
  await land.getByLabel(say('growing.land.statusSince')).fill('2025-05-01')
  await land.getByRole('button', { name: say('growing.land.save') }).click()
  await expect(land).toBeHidden()
  await expect(page.getByText('in transition since 1 May 2025')).toBeVisible()

  await page.getByRole('button', { name: say('growing.plantings.add') }).click()
  const planting = page.getByRole('dialog', { name: say('growing.plantings.form', { code }) })
  await field(planting, say('growing.plantings.crop')).fill('Apple')
  await field(planting, say('growing.plantings.eppo')).fill('no')
  await planting.getByRole('button', { name: say('growing.plantings.save') }).click()
  await expect(planting.getByText(say('problems.planting.eppo'))).toBeVisible()
  await expect(field(planting, say('growing.plantings.crop'))).toHaveValue('Apple')
  await field(planting, say('growing.plantings.eppo')).fill('mabsd')
  await planting.getByLabel(say('growing.plantings.plantedOn')).fill('2014-03-20')
  await field(planting, say('growing.plantings.plants')).fill('640')
  await planting.getByRole('button', { name: say('growing.plantings.save') }).click()
  await expect(planting).toBeHidden()
  await expect(page.getByText('planted 20 March 2014, 640 plants, MABSD')).toBeVisible()
  await expect(page.getByText('Apple, planted 2014')).toBeVisible()
})

test('other work is noted in two presses, and taken back with a reason', async ({ page, manager }) => {
  const { id } = await makeBlock(manager)
  await page.goto(`/blocks/${id}`)
  await page.getByRole('button', { name: say('growing.events.add') }).click()
  const mown = page.getByRole('button', { name: say('growing.events.kindOf.mown'), exact: true })
  expect((await mown.boundingBox())?.height).toBeGreaterThanOrEqual(48)
  await mown.click()
  await expect(mown).toBeHidden()
  const event = page.getByRole('listitem').filter({ hasText: say('growing.events.kindOf.mown') })
  await expect(event).toBeVisible()
  await event.getByRole('button').click()
  const asked = page.getByRole('dialog')
  await field(asked, say('growing.events.reason')).fill('The wrong block')
  await asked.getByRole('button', { name: say('growing.events.takeBack'), exact: true }).click()
  await expect(event).toContainText('The wrong block')
  await expect(event.getByRole('button')).toHaveCount(0)
})

test('a changed boundary is a version beside the older, and a record signed before still prints the older', async ({ page, manager }) => {
  const things = await makeThings(manager)
  const { block } = things
  const record = await makeSignedRecord(manager, things)
  const printed = async () => readText(await (await page.request.get(`/api/farms/${manager.farmId}/records/${record.id}/pdf`)).body())
  const before = await printed()
  expect(before).toContain(`${block.code} version 1`)
  const redrawn = await manager.patch(`/blocks/${block.id}`, { revision: block.revision, geometry: QUARTER, acknowledged: OVER }, blockSchema)
  expect(redrawn.version).toBe(2)
  expect(redrawn.areaM2).toBeLessThan(block.areaM2 / 3)
  // Blocks beside it are drawn as they stand when it is printed.
  const figures = (text: string) => text.replace(/^.*? treated /, '').replace(/Printed .*$/, '')
  expect(figures(await printed())).toBe(figures(before))

  await page.goto(`/blocks/${block.id}`)
  await page.getByRole('button', { name: say('growing.land.boundaries', { count: 2 }) }).click()
  const versions = page.getByRole('dialog', { name: say('growing.boundaries.title', { code: block.code }) })
  await expect(versions.getByText('−75.00 %')).toBeVisible()
  const older = versions.getByRole('listitem').filter({ hasText: 'version 1,' })
  await expect(older.getByRole('link', { name: record.number ?? '' })).toBeVisible()
})
