import { readFileSync } from 'node:fs'
import { recordSheet } from '../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../shared/mix/sheetTypes.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { readPdf } from '../support/readPdf.ts'
import { field, segment } from './support/controls.ts'
import { emailOf, PASSWORD } from './support/demoFarm.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { listLots, makeThings } from './support/things.ts'
import { registerRow } from './support/registerRow.ts'
import { say, saying } from './support/words.ts'

const drawing = JSON.parse(readFileSync('server/demo/demoBlocks.geojson', 'utf8')) as { features: { properties: { code: string } }[] }
const demoCodes = drawing.features.map(({ properties }) => properties.code)

/** Litres as an account shows them: a decimal over 100, two over 1, three under it. */
function litres(value: number | string | null): string {
  const size = Number(value)
  return formatNumber(value ?? '', { digits: size >= 100 ? 1 : size >= 1 ? 2 : 3 }, 'en')
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
  // On a phone the name gives way where what other stories drew makes the farm wide.
  if (!isPhone) await expect(map.getByText('Wenn Brook', { exact: true })).toBeVisible()
  await expect(map.locator('path.site-ring')).toHaveCount(5)
  expect(tiles).toEqual([])
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
