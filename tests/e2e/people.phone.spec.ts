import { randomUUID } from 'node:crypto'
import type { APIRequestContext } from '@playwright/test'
import { personSchema, type Person } from '../../shared/contract/person.ts'
import { sharedPhoneSchema } from '../../shared/contract/sharedPhone.ts'
import { field } from './support/controls.ts'
import { apiOf, openFarm, OURS, PASSWORD, type FarmApi } from './support/demoFarm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeEndedRecord, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

const PIN = '481902'

const takeIn = (owner: FarmApi): Promise<Person> =>
  owner.post('/people', { id: randomUUID(), name: unique('Wick '), pin: PIN, password: PASSWORD }, personSchema)

/** Makes this browser a phone of the farm, on which the person is signed in by PIN. */
async function signInByPin(request: APIRequestContext, personId: string): Promise<void> {
  const manager = await openFarm(request, 'manager')
  await manager.post('/shared-phones', { id: randomUUID(), name: unique('Phone '), password: PASSWORD }, sharedPhoneSchema)
  await request.delete('/api/session', { headers: OURS })
  const answer = await request.post('/api/shared-phone/session', { headers: OURS, data: { personId, pin: PIN } })
  expect(answer.status()).toBe(200)
}

test('somebody without e-mail signs a record by PIN on a phone of the farm', async ({ page, context, playwright, baseURL, signInAs, manager }) => {
  const owner = await openFarm(await playwright.request.newContext({ baseURL: baseURL ?? '' }), 'owner')
  const person = await takeIn(owner)
  const things = await makeThings(manager)

  await signInAs('manager')
  await openScreen(page, '/farm/people')
  await page.getByRole('button', { name: say('people.phones.enrol') }).click()
  const dialog = page.getByRole('dialog', { name: say('people.phones.enrolTitle') })
  await field(dialog, say('people.phones.name')).fill(unique('Barn phone '))
  await field(dialog, say('people.yourPassword')).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('people.phones.enrolAction') }).click()
  await expect(page).toHaveURL(/\/signin$/)

  await page.getByRole('button', { name: person.name }).click()
  const pin = field(page, say('pin.pinOf', { name: person.name }))
  await pin.fill('907315')
  await page.getByRole('button', { name: say('pin.open') }).click()
  await expect(page.getByRole('alert')).toContainText(say('pin.wrong'))
  await pin.fill(PIN)
  await page.getByRole('button', { name: say('pin.open') }).click()
  await expect(page).not.toHaveURL(/signin/)

  const record = await makeEndedRecord(apiOf(context.request, owner.farmId), things)
  await openScreen(page, `/register/${record.id}`)
  await page.getByRole('button', { name: say('recordRead.goOn') }).click()
  await field(page, say('pin.yours')).fill(PIN)
  await page.getByRole('button', { name: say('records.sign.sign'), exact: true }).click()
  await page.getByRole('button', { name: say('records.signed.open') }).click()
  await expect(page.getByText(say('people.signedByPin', { name: person.name })).first()).toBeVisible()
})

test('who is let go is refused at the next click', async ({ page, context, browser, playwright, baseURL }) => {
  const owner = await openFarm(await playwright.request.newContext({ baseURL: baseURL ?? '' }), 'owner')
  const person = await takeIn(owner)
  await signInByPin(context.request, person.id)
  await openScreen(page, '/farm/people')

  const ownerContext = await browser.newContext({ baseURL: baseURL ?? '', reducedMotion: 'reduce' })
  await openFarm(ownerContext.request, 'owner')
  const ownerPage = await ownerContext.newPage()
  await openScreen(ownerPage, `/farm/people/${person.id}`)
  await ownerPage.getByRole('button', { name: say('people.deed.letGo.button') }).click()
  const dialog = ownerPage.getByRole('dialog', { name: say('people.deed.letGo.title', { name: person.name }) })
  await field(dialog, say('people.yourPassword')).fill('not the password')
  await dialog.getByRole('button', { name: say('people.deed.letGo.action') }).click()
  await expect(dialog.getByRole('alert')).toBeVisible()
  await field(dialog, say('people.yourPassword')).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('people.deed.letGo.action') }).click()
  await expect(ownerPage.getByText(say('people.person.left'))).toBeVisible()
  await ownerContext.close()

  await page.getByRole('navigation', { name: say('frame.placesLabel') }).getByRole('link', { name: say('frame.places.register') }).click()
  const reentry = page.getByRole('dialog', { name: say('pin.reentryTitle') })
  await field(reentry, say('pin.pinOf', { name: person.name })).fill(PIN)
  await reentry.getByRole('button', { name: say('session.reentry.goOn') }).click()
  await expect(reentry.getByRole('alert')).toContainText(say('pin.wrong'))
})
