import { randomUUID } from 'node:crypto'
import { farmSchema } from '../../shared/contract/farm.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { blockSchema } from '../../shared/contract/block.ts'
import { pageOf } from '../../shared/contract/common.ts'
import { openFarm, OURS, signInTo, type Who } from './support/demoFarm.ts'
import { RecordForm } from './support/recordForm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

test('the applicator records and signs, and has nothing to draw or add with', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  await signInAs('applicator')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  await form.start()
  await form.endNow()
  await form.sign()
  expect(await form.signedNumber()).toMatch(/^\d{4}-\d{4}$/)

  for (const [path, words] of [
    ['/blocks', 'blocks.draw.link'], ['/blocks', 'blocks.draw.byDraw'], ['/blocks', 'blocks.draw.byPoints'], ['/inputs', 'inputs.newMaterial'],
    ['/inputs', 'inputs.receiveLot'], ['/inputs', 'inputs.count'], ['/farm/sprayers', 'farm.addSprayer'],
  ] as const) {
    await openScreen(page, path)
    await expect(page.getByRole('button', { name: say(words), exact: true })).toHaveCount(0)
  }
  await page.goto('/blocks/new')
  await expect(page.getByText(say('frame.notFound.text'))).toBeVisible()
})

test('the certifier reads what is granted and can begin nothing', async ({ page, signInAs, manager }) => {
  const record = await makeSignedRecord(manager, await makeThings(manager))
  await signInAs('certifier')
  await page.goto('/')
  await expect(page).toHaveURL(/\/farms$/)
  await expect(page.getByRole('heading', { name: say('farm.myFarms.title') })).toBeVisible()
  const places = page.getByRole('navigation', { name: say('frame.placesLabel') })
  await expect(places.getByRole('link', { name: say('frame.places.my-farms') })).toBeVisible()
  for (const place of ['today', 'farm']) await expect(places.getByRole('link', { name: say(`frame.places.${place}`), exact: true })).toHaveCount(0)
  await page.getByRole('button', { name: say('grants.myFarms.of', { act: say('grants.myFarms.open'), farm: 'Wennick Hollow', season: record.season ?? '' }) }).click()
  await expect(page).toHaveURL(/\/register\?season=\d{4}$/)
  await expect(page.getByRole('link', { name: new RegExp(`${record.number?.slice(-4)}`) })).toBeVisible()
  await expect(page.getByRole('button', { name: say('register.newRecord') })).toHaveCount(0)
  await openScreen(page, `/register/${record.id}`)
  await expect(page.getByRole('link', { name: say('recordRead.openPdf') })).toBeVisible()
  await expect(page.getByRole('button', { name: say('recordRead.like') })).toHaveCount(0)
  const pdf = await page.request.get(`/api/farms/${manager.farmId}/records/${record.id}/pdf`)
  expect(pdf.status()).toBe(200)
  for (const path of ['/register/new', '/blocks/new', '/farm']) {
    await page.goto(path)
    await expect(page.getByText(say('frame.notFound.text'))).toBeVisible()
  }
})

test("the neighbour's things are not there for any role", async ({ page, context, playwright, baseURL }) => {
  const request = await playwright.request.newContext({ baseURL: baseURL ?? '' })
  const neighbour = await openFarm(request, 'neighbour')
  const [block] = (await neighbour.get('/blocks', pageOf(blockSchema))).items
  const [record] = (await neighbour.get('/records', pageOf(registerRowSchema))).items
  await request.dispose()
  for (const who of ['owner', 'manager', 'applicator', 'certifier'] satisfies Who[]) {
    await signInTo(context.request, who)
    await page.goto(`/blocks/${block?.id}`)
    await expect(page.getByText(say('blocks.page.missing'))).toBeVisible()
    await page.goto(`/register/${record?.id}`)
    await expect(page.getByText(say('recordRead.notHere'))).toBeVisible()
    for (const path of ['', '/blocks', `/blocks/${block?.id}`, `/records/${record?.id}`, `/records/${record?.id}/pdf`]) {
      const answer = await page.request.get(`/api/farms/${neighbour.farmId}${path}`)
      expect(answer.status(), `${who} ${path}`).toBe(404)
    }
  }
})

test('who has several farms goes from one to the other', async ({ page, context }) => {
  await signInTo(context.request, 'owner')
  // After the demo farm in every list: who has several farms opens the first.
  const name = unique('Zell second ')
  const made = await context.request.post('/api/farms', { headers: OURS, data: { id: randomUUID(), name, zone: 'America/Los_Angeles', seasonStart: '03-01' } })
  expect(farmSchema.parse(await made.json()).name).toBe(name)
  await openScreen(page, '/blocks')
  const farms = page.getByRole('combobox', { name: say('frame.farmSwitch') })
  await farms.selectOption({ label: name })
  await expect(page).toHaveURL(/\/$/)
  await openScreen(page, '/blocks')
  await expect(farms.locator('option:checked')).toHaveText(name)
  await expect(page.getByText(say('blocks.empty.title'))).toBeVisible()
  await farms.selectOption({ label: 'Wennick Hollow' })
  await openScreen(page, '/blocks')
  await expect(page.getByRole('rowheader', { name: /^A3 / })).toBeVisible()
})
