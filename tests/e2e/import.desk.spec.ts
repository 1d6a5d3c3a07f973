import { readFileSync } from 'node:fs'
import type { Page } from '@playwright/test'
import { findFaults } from './support/axe.ts'
import { blocksOf, ImportForm, openNewFarm } from './support/importForm.ts'
import { expect, test } from './support/test.ts'
import { watchPages } from './support/watchPage.ts'
import { say } from './support/words.ts'

const FILES = ['blocks.geojson', 'blocks.kml', 'blocks.kmz', 'blocks.gpx', 'blocks.zip'] as const

for (const name of FILES) {
  test(`forty shapes of ${name}: 38 become blocks, the two bad ones are named with their reason`, async ({ page, context }) => {
    const found = await watchPages(context, { strict: true })
    const farmId = await openNewFarm(context)
    const form = new ImportForm(page)
    await form.open()
    await form.choose(name)
    if (name === 'blocks.gpx') {
      await expect(form.count(40, 0, 40, 0)).toBeVisible()
      await form.main.locator('label').filter({ hasText: say('importing.close') }).click()
    }
    await expect(form.count(40, 38, 2, 0)).toBeVisible()

    await expect(form.shape(17)).toContainText('Crossed piece')
    await expect(form.shape(17)).toContainText(name === 'blocks.kmz' ? say('importing.refused.empty') : 'The outline crosses itself near')
    await expect(form.shape(29)).toContainText('Speck')
    await expect(form.shape(29)).toContainText('A block has between 1 m² and 50 000 ha')
    await expect(form.shape(1).getByRole('textbox').last()).toHaveValue('Ñandú 1')

    await form.importButton.click()
    await expect(page).toHaveURL(/\/blocks$/)
    await expect(page.getByText('38 blocks imported, 2 not.')).toBeVisible()
    const blocks = await blocksOf(context, farmId)
    expect(blocks).toHaveLength(38)
    expect(blocks.map((block) => block.name)).toContain('Łąka 4')
    expect(found).toEqual([])
  })
}

test('a second time the same file is seen as there already; a shape changed in the table comes in under its new words', async ({ page, context }) => {
  const farmId = await openNewFarm(context)
  const form = new ImportForm(page)
  await form.open()
  await form.choose('blocks.geojson')
  await expect(form.importButton).toHaveText('Import 38 blocks')
  await form.importButton.click()
  await expect(page).toHaveURL(/\/blocks$/)

  await form.open()
  await form.choose('blocks.kml')
  await expect(form.count(40, 0, 2, 38)).toBeVisible()
  await expect(form.shape(1)).toContainText('Already drawn as N1')
  expect(await findFaults(page)).toEqual([])
  await form.shape(1).getByRole('checkbox').check()
  await form.shape(1).getByRole('textbox').first().fill('N2')
  await form.importButton.click()
  await expect(form.shape(1)).toContainText(say('importing.error.taken'))
  await form.shape(1).getByRole('textbox').first().fill('Twice')
  await form.importButton.click()
  await expect(form.main.getByText(say('blocks.unlikely.reasonNeeded'))).toBeVisible()
  await form.main.getByRole('textbox', { name: say('importing.reason') }).fill('Two tiers of one slope')
  await form.importButton.click()
  await expect(page).toHaveURL(/\/blocks$/)
  expect((await blocksOf(context, farmId)).map(({ code }) => code)).toContain('Twice')
})

test('what goes out comes in again, outline for outline', async ({ page, context }) => {
  const from = await openNewFarm(context)
  const form = new ImportForm(page)
  await form.open()
  await form.choose('blocks.zip')
  await form.importButton.click()
  await expect(page).toHaveURL(/\/blocks$/)
  const outlines = async (farmId: string): Promise<unknown> => Object.fromEntries((await blocksOf(context, farmId)).map(({ code, name, geometry }) => [code, { name, geometry }]))
  const before = await outlines(from)
  const files = [await download(page, 'GeoJSON'), await download(page, 'KML')]

  const farmId = await openNewFarm(context)
  for (const [index, buffer] of files.entries()) {
    await form.open()
    await form.choose({ name: `out.${index}`, mimeType: 'application/octet-stream', buffer })
    await expect(index === 0 ? form.count(38, 38, 0, 0) : form.count(38, 0, 0, 38)).toBeVisible()
    if (index === 0) {
      await form.importButton.click()
      await expect(page).toHaveURL(/\/blocks$/)
    }
  }
  expect(await blocksOf(context, farmId)).toHaveLength(38)
  expect(await outlines(farmId)).toEqual(before)
})

test('a file that would harm is refused in words, and leaving an open one is asked about', async ({ page, signInAs }) => {
  await signInAs('manager')
  const form = new ImportForm(page)
  await form.open()
  const bomb = '<!DOCTYPE kml [<!ENTITY a "aaaa"><!ENTITY b SYSTEM "file:///etc/passwd">]><kml><name>&a;&b;</name></kml>'
  await form.choose({ name: 'bomb.kml', mimeType: 'application/octet-stream', buffer: Buffer.from(bomb) })
  await expect(form.main.getByText(say('importing.fault.dtd'))).toBeVisible()

  await form.choose('blocks.geojson')
  await expect(form.count(40, 38, 2, 0)).toBeVisible()
  await expect(form.main.getByText(say('importing.kept'))).toBeVisible()
  await form.main.getByRole('link', { name: say('blocks.page.all') }).click()
  await page.getByRole('dialog').getByRole('button', { name: say('importing.leave.stay') }).click()
  await expect(form.count(40, 38, 2, 0)).toBeVisible()
  await form.main.getByRole('link', { name: say('blocks.page.all') }).click()
  await page.getByRole('dialog').getByRole('button', { name: say('importing.leave.go') }).click()
  await expect(page).toHaveURL(/\/blocks$/)
})

async function download(page: Page, format: string): Promise<Buffer> {
  const [file] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: `${say('importing.export')} ${format}` }).click()])
  return readFileSync(await file.path())
}
