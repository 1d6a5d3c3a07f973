import { randomUUID } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import type { APIRequestContext } from '@playwright/test'
import { parse } from 'csv-parse/sync'
import { farmSchema } from '../../shared/contract/farm.ts'
import { pageOf } from '../../shared/contract/common.ts'
import { seasonsSchema } from '../../shared/contract/seasonReport.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { emailOf, farmApi, OURS, PASSWORD, signInTo } from './support/demoFarm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

/** A farm of the owner's own with one signed record, so that ending its grant takes nothing from other tests. */
async function makeFarm(request: APIRequestContext): Promise<{ id: string; name: string; season: number }> {
  await signInTo(request, 'owner')
  // After the demo farm in every list: who has several farms opens the first.
  const name = unique('Zell grants ')
  const made = await request.post('/api/farms', { headers: OURS, data: { id: randomUUID(), name, zone: 'America/Los_Angeles', seasonStart: '03-01' } })
  const { id, currentSeason } = farmSchema.parse(await made.json())
  const api = farmApi(request, id)
  await makeSignedRecord(api, await makeThings(api))
  return { id, name, season: currentSeason }
}

test('a certifier is let in for one season, takes its register away, and is out at the end', async ({ page, context, browser, baseURL }) => {
  const farm = await makeFarm(context.request)
  await context.addInitScript((farmId) => { localStorage.setItem('drenchleaf.farm', farmId) }, farm.id)

  await openScreen(page, '/farm/grants')
  await expect(page.getByText(say('grants.none'))).toBeVisible()
  await page.getByRole('button', { name: say('grants.give') }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel(say('grants.form.email')).fill(emailOf('certifier'))
  await dialog.getByLabel(say('grants.form.organisation')).fill('Oaklode Review')
  await expect(dialog.getByLabel(say('grants.form.running', { season: farm.season }))).toBeChecked()
  await dialog.getByLabel(say('grants.form.password'), { exact: true }).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('grants.form.save') }).click()
  await expect(page.getByRole('rowheader', { name: /Oaklode Review/ })).toBeVisible()

  const other = await browser.newContext({ baseURL: baseURL ?? '' })
  const reader = await other.newPage()
  await signInTo(other.request, 'certifier')
  await openScreen(reader, '/farms')
  const row = (act: 'report' | 'open') => reader.getByRole('button', { name: say('grants.myFarms.of', { act: say(`grants.myFarms.${act}`), farm: farm.name, season: farm.season }) })
  await row('report').click()
  const pdfHref = await reader.getByRole('link', { name: say('grants.season.pdf') }).getAttribute('href')
  const pdf = await (await other.request.get(pdfHref ?? '')).body()
  expect(pdf.subarray(0, 5).toString()).toBe('%PDF-')
  const downloading = reader.waitForEvent('download')
  await reader.getByRole('link', { name: say('grants.season.csv') }).click()
  const rows = parse(await readFile(await (await downloading).path()), { bom: true, columns: true }) as object[]
  expect(rows).toHaveLength(1)
  await reader.keyboard.press('Escape')
  await expect(reader.getByRole('row', { name: new RegExp(farm.name) })).toContainText(say('grants.myFarms.agrees'))

  await row('open').click()
  await expect(reader).toHaveURL(new RegExp(`/register\\?season=${farm.season}$`))
  const { items } = pageOf(registerRowSchema).parse(await (await other.request.get(`/api/farms/${farm.id}/records`)).json())
  const number = items[0]?.number ?? ''
  await expect(reader.getByRole('link', { name: new RegExp(number.slice(-4)) }).first()).toBeVisible()

  await page.getByRole('button', { name: say('grants.of', { act: say('grants.end'), who: 'Oaklode Review' }) }).click()
  await dialog.getByLabel(say('grants.form.password'), { exact: true }).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('grants.endForm.save') }).click()
  await expect(page.getByText(say('grants.endForm.done', { who: 'Oaklode Review' }))).toBeVisible()

  const refused = reader.waitForResponse((answer) => answer.url().includes(`/api/farms/${farm.id}/`) && answer.status() === 404)
  await reader.getByRole('link', { name: new RegExp(number.slice(-4)) }).first().click()
  await refused
  await expect(reader).toHaveURL(/\/farms$/)
  expect((await other.request.get(pdfHref ?? '')).status()).toBe(404)
  await openScreen(reader, '/farms')
  await expect(row('open')).toHaveCount(0)
  await other.close()

  await openScreen(page, '/farm/journal')
  await expect(page.getByRole('row', { name: new RegExp(`${say('journal.action.grant.ended')}.*Oaklode Review`) })).toBeVisible()
  await expect(page.getByRole('row', { name: new RegExp(say('journal.action.report.downloaded')) }).first()).toContainText(say('journal.format.csv'))
  expect(seasonsSchema.parse(await (await context.request.get(`/api/farms/${farm.id}/seasons`)).json()).items).toMatchObject([{ season: farm.season, records: 1 }])
})
