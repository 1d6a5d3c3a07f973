import { readFileSync } from 'node:fs'
import { recordSheet } from '../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../shared/mix/sheetTypes.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { readPdf } from '../support/readPdf.ts'
import { BlockForm, extentOf, typedPoints } from './support/blockForm.ts'
import { choose, field, segment } from './support/controls.ts'
import { emailOf, PASSWORD } from './support/demoFarm.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { listBlocks, listLots, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { registerRow } from './support/registerRow.ts'
import { say, saying } from './support/words.ts'

const drawing = JSON.parse(readFileSync('server/demo/demoBlocks.geojson', 'utf8')) as { features: { properties: { code: string } }[] }
const demoCodes = drawing.features.map(({ properties }) => properties.code)

/** Litres as an account shows them: a decimal over 100, two over 1, three under it. */
function litres(value: number | string | null): string {
  const size = Number(value)
  return formatNumber(value ?? '', { digits: size >= 100 ? 1 : size >= 1 ? 2 : 3 }, 'en')
}

/** What the page says of an outline of four corners; area in hectares, perimeter in metres. */
function figuresOf({ area, perimeter }: { area: string; perimeter: string }): string {
  return say('blocks.draw.figures', { area: say('blocks.hectares', { figure: area }), perimeter: say('blocks.page.metres', { figure: perimeter }), points: 4 })
}

test('signs in as the manager and sees the 24 blocks over the ground plan', async ({ page, isPhone }) => {
  const tiles: string[] = []
  page.on('request', (request) => { if (request.url().includes('/tiles/')) tiles.push(request.url()) })
  await page.goto('/blocks')
  await expect(page).toHaveURL(/\/signin\?next=/)
  await field(page, say('session.email')).fill(emailOf('manager'))
  await field(page, say('session.password')).fill(PASSWORD)
  await page.getByRole('button', { name: say('session.openRegister') }).click()
  await expect(page).toHaveURL(/\/blocks$/)

  const list = page.getByRole('table', { name: say('blocks.list.caption') })
  for (const code of demoCodes) await expect(list.getByRole('rowheader', { name: new RegExp(`^${code} `) })).toBeVisible()
  expect(demoCodes).toHaveLength(24)

  if (isPhone) await segment(page, say('blocks.map.show'))
  const map = page.getByRole('application', { name: say('blocks.map.label') })
  await expect(map.locator('path.leaflet-interactive').nth(demoCodes.length - 1)).toBeAttached()
  await expect(map.locator('path.ground-water').first()).toBeAttached()
  await expect(map.getByText('Wenn Brook', { exact: true })).toBeVisible()
  await expect(map.locator('path.site-ring')).toHaveCount(5)
  expect(tiles).toEqual([])
})

test('draws a block by keyboard, with its live area, and saves it', async ({ page, isPhone, signInAs, manager }) => {
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
  if (!isPhone) await expect(page.getByRole('complementary', { name: say('frame.checks') }).getByText('0.25 ha')).toBeVisible()
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

test('records a drench: sheet, reload, start, end, signature, lots, PDF, register', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const { block, first, second, sprayer } = things
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await form.addComponent()
  await form.setComponent(say('records.mix.unnamed', { number: 2 }), { material: second.material.name, lot: second.lot.code, kind: 'perTank', value: '1.5' })

  const sheet = recordSheet({
    lines: [{ areaM2: block.areaM2 }], tankL: '120',
    water: { sizedFrom: 'water', value: '200', unit: 'L' },
    components: [{ basis: { kind: 'ratio', parts: '20' } }, { basis: { kind: 'perTank', value: '1.5', unit: 'L' } }],
  })
  await expectSheet(form, isPhone, sheet, [first.material.name, second.material.name])
  const checks = await form.checks()
  await expect(checks.getByText(say('records.working.head'))).toBeVisible()
  await expect(checks.getByText(`${first.material.name}: 200 L ÷ 20 = 10 L`)).toBeVisible()
  await expect(checks.getByText(saying('records.working.loads'))).toBeVisible()
  await form.closeChecks()

  await expect(page).toHaveURL(/draft=/)
  await page.reload()
  await expectSheet(form, isPhone, sheet, [first.material.name, second.material.name])

  await form.start()
  await form.endNow()
  await form.sign('not the password')
  await expect(form.main.getByRole('alert').filter({ hasText: say('records.sign.wrongPassword') })).toBeVisible()
  await expect(form.main.getByText(block.code, { exact: true })).toBeVisible()
  await form.sign()
  const number = await form.signedNumber()
  expect(number).toMatch(/^\d{4}-\d{4}$/)

  const pdfPath = await form.main.getByRole('link', { name: say('records.signed.openPdf') }).getAttribute('href')
  const pdf = await page.request.get(pdfPath ?? '')
  expect(pdf.status()).toBe(200)
  expect(pdf.headers()['content-type']).toContain('application/pdf')
  const { check, text } = readPdf(await pdf.body())
  expect(check).toContain('No syntax or stream encoding errors found')
  for (const words of [number, block.code, first.material.name, first.lot.code, second.lot.code, sprayer.code, litres(sheet.totalL), '10']) expect(text).toContain(words)

  await form.main.getByRole('button', { name: say('records.signed.register') }).click()
  await expect(registerRow(page, isPhone, number.slice(-4))).toContainText(block.code)

  const drawn = sheet.components.map(({ amount }) => 100 - Number(amount?.value))
  const left = await Promise.all([first, second].map(async ({ material }) => Number((await listLots(manager, material.id))[0]?.left.value)))
  expect(left).toEqual(drawn)
  await page.goto('/inputs')
  await expect(page.getByRole('row').filter({ hasText: first.lot.code })).toContainText('90 L')
})

/** Every figure of the mix stands on the page as the sheet has it. */
async function expectSheet(form: RecordForm, isPhone: boolean, sheet: RecordSheet, names: string[]): Promise<void> {
  const { loads, water, components } = sheet
  const lines = [
    { name: say('records.mix.carrier'), all: sheet.waterL, full: water.perFullLoad, last: water.perLastLoad },
    ...components.map(({ amount, perFullLoad, perLastLoad }, index) => ({ name: names[index] ?? '', all: amount?.value ?? null, full: perFullLoad, last: perLastLoad })),
  ]
  expect(loads).not.toBeNull()
  for (const { name, all, full, last } of lines) {
    if (isPhone) {
      const line = form.mixLine(name)
      await expect(line).toContainText(`${litres(full)}`)
      await expect(line).toContainText(litres(all))
    } else {
      const cells = form.main.getByRole('row').filter({ has: form.mixLine(name) }).getByRole('cell')
      await expect(cells.nth(3)).toContainText(litres(all))
      await expect(cells.nth(4)).toHaveText(litres(full))
      await expect(cells.nth(5)).toHaveText(litres(last))
    }
  }
  await expect(form.main.getByText(litres(isPhone ? (loads?.tankL ?? null) : sheet.totalL)).first()).toBeVisible()
}
