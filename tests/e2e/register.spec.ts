import type { Page } from '@playwright/test'
import type { RegisterRow } from '../../shared/contract/record.ts'
import { readPdf } from '../support/readPdf.ts'
import { choose, field } from './support/controls.ts'
import { findWide } from './support/findWide.ts'
import { registerRow } from './support/registerRow.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

/** The words and the choices, in the drawer on a phone. */
async function openFilters(page: Page, isPhone: boolean): Promise<void> {
  if (isPhone) await page.getByRole('main').getByRole('button', { name: new RegExp(`^${say('register.filter.open')}`) }).click()
  await expect(page.getByRole('search')).toBeVisible()
}

test('a record is found by words and by choice, the choice is kept, and what was found is printed', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const wanted = await makeSignedRecord(manager, things)
  const other = await makeSignedRecord(manager, { ...things, first: things.second })
  const row = (number: string | null) => registerRow(page, isPhone, number?.slice(-4) ?? '')
  await signInAs('manager')
  await openScreen(page, '/register')

  await openFilters(page, isPhone)
  await field(page, say('register.filter.q')).fill(things.block.code)
  await field(page, say('register.filter.q')).press('Enter')
  if (isPhone) await page.getByRole('button', { name: say('register.filter.show') }).click()
  await expect(row(wanted.number)).toBeVisible()
  await expect(row(other.number)).toBeVisible()
  await expect(page.getByText(say('register.foot.rowsAll', { last: 2 }))).toBeVisible()

  await openFilters(page, isPhone)
  await choose(page.getByRole('search'), say('register.filter.material'), things.first.material.name)
  if (isPhone) await page.getByRole('button', { name: say('register.filter.show') }).click()
  await expect(row(other.number)).toHaveCount(0)
  await expect(row(wanted.number)).toBeVisible()

  const name = unique('Kept ')
  await page.getByRole('button', { name: say('register.saved.keep') }).click()
  const naming = page.getByRole('dialog', { name: say('register.saved.title') })
  await field(naming, say('register.saved.name')).fill(name)
  await naming.getByRole('button', { name: say('register.saved.save') }).click()
  await expect(naming).toBeHidden()
  await page.getByRole('button', { name: say('register.filter.clear') }).filter({ visible: true }).click()
  await expect(page.getByText(say('register.foot.rowsAll', { last: 1 }))).toHaveCount(0)
  await page.getByRole('link', { name, exact: true }).click()
  await expect(page.getByText(say('register.foot.rowsAll', { last: 1 }))).toBeVisible()

  await page.getByRole('button', { name: say('register.files.open') }).click()
  const taking = page.getByRole('dialog', { name: say('register.files.title') })
  const [csvPath, pdfPath] = await Promise.all(['csv', 'pdf'].map((kind) => taking.getByRole('link', { name: say(`register.files.${kind}` as 'register.files.csv') }).getAttribute('href')))
  const csv = await (await page.request.get(csvPath ?? '')).text()
  const pdf = readPdf(await (await page.request.get(pdfPath ?? '')).body())
  expect(pdf.check).toContain('No syntax or stream encoding errors found')
  for (const text of [csv, pdf.text]) {
    for (const words of [wanted.number ?? '', things.block.code, things.first.lot.code]) expect(text).toContain(words)
    expect(text).not.toContain(other.number ?? '')
  }
  expect(pdf.text).toContain(say('pdf.running.page', { page: 1, pages: 1 }))
})

/** As wide as a row can be: every field at its longest. */
const WIDEST: Partial<RegisterRow> = {
  version: 12, blocks: [{ id: 'a', code: 'WWWWWWWWWWWW' }, { id: 'b', code: 'MMMMMMMMMMMM' }], preparations: ['Wormwood and horsetail ferment', 'Wettable sulphur'],
  lots: ['WORMWOOD-2026-LOT-000001', 'SULPHUR-0001'], areaHa: '123.45', totalL: '98765.4', sprayLPerHa: '12345', by: 'Wilhelmina Montgomery-Wentworth', lateHours: 1234,
  tally: { stop: 0, caution: 0, unknown: 12 },
}

test('a row at its widest stays within the page', async ({ page, isPhone, signInAs, manager }) => {
  const { number } = await makeSignedRecord(manager, await makeThings(manager))
  await page.route(/\/records\?/, async (route) => {
    const response = await route.fetch()
    const { items, next } = await response.json() as { items: RegisterRow[]; next: string | null }
    await route.fulfill({ response, json: { items: items.map((row) => (row.number === number ? { ...row, ...WIDEST } : row)), next } })
  })
  await signInAs('manager')
  await openScreen(page, '/register')
  await expect(registerRow(page, isPhone, number?.slice(-4) ?? '')).toContainText(WIDEST.by ?? '')
  for (const width of isPhone ? [390, 320] : [1440, 1280, 1180, 1024]) {
    await page.setViewportSize({ width, height: 844 })
    expect(await findWide(page), String(width)).toEqual([])
  }
})
