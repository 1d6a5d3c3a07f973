import { randomUUID } from 'node:crypto'
import type { APIRequestContext, Page } from '@playwright/test'
import { generate } from 'otplib'
import { ownSessionsSchema } from '../../shared/contract/me.ts'
import { OURS, signInTo } from './support/demoFarm.ts'
import { linkTo } from './support/letters.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

const SECRET = 'wet leaves before sunrise'
const STEP_S = 30

/** Somebody new on a farm of their own: what they set up is nobody else's way in. */
async function makeAccount(request: APIRequestContext): Promise<string> {
  await signInTo(request, 'neighbour')
  const farm = { id: randomUUID(), name: `Zz ${unique('factor ')}`, zone: 'America/Los_Angeles', seasonStart: '03-01' }
  expect((await request.post('/api/farms', { headers: OURS, data: farm })).status()).toBe(201)
  const email = `${unique('cato')}@farm.example`.toLowerCase()
  const invitation = { id: randomUUID(), email, role: 'applicator', language: 'en' }
  expect((await request.post(`/api/farms/${farm.id}/invitations`, { headers: OURS, data: invitation })).status()).toBe(201)
  const token = (await linkTo(request, email, say('mail.invitation.subject', { farm: farm.name }))).split('/').at(-1)
  expect((await request.post('/api/welcome', { headers: OURS, data: { token, name: 'Cato', password: SECRET } })).status()).toBe(204)
  return email
}

/** The server's clock, seconds: a session that was just opened says when. */
async function serverTime({ request }: Page): Promise<number> {
  const { items } = ownSessionsSchema.parse(await (await request.get('/api/me/sessions')).json())
  return Math.floor(Math.max(...items.map(({ openedAt }) => Date.parse(openedAt))) / 1000)
}

async function writePassword(page: Page, email: string): Promise<void> {
  await page.getByLabel(say('session.email')).fill(email)
  await page.getByLabel(say('session.password'), { exact: true }).fill(SECRET)
  await page.getByRole('button', { name: say('session.openRegister') }).click()
}

async function writeCode(page: Page, code: string): Promise<void> {
  await page.getByLabel(say('pin.code')).fill(code)
  await page.getByRole('button', { name: say('session.openRegister') }).click()
}

async function signOut(page: Page): Promise<void> {
  expect((await page.request.delete('/api/session', { headers: OURS })).status()).toBe(204)
  await page.goto('/signin')
}

test('a second factor is set up, asked at the next sign-in, and a recovery code opens once', async ({ browser, playwright, baseURL }) => {
  const aside = await playwright.request.newContext({ baseURL: baseURL ?? '' })
  const email = await makeAccount(aside)
  await aside.dispose()
  const page = await (await browser.newContext({ baseURL: baseURL ?? '' })).newPage()
  await page.goto('/signin?next=/me')
  await writePassword(page, email)
  await expect(page).toHaveURL(/\/me$/)
  await page.getByLabel(say('people.yourPassword')).last().fill(SECRET)
  await page.getByRole('button', { name: say('people.factor.begin') }).click()
  const secret = (await page.locator('b.secret').innerText()).replaceAll(/\s/g, '')
  const begun = await serverTime(page)
  await page.getByLabel(say('people.factor.code')).fill(await generate({ secret, epoch: begun }))
  await page.getByRole('button', { name: say('people.factor.confirm') }).click()
  const codes = page.getByRole('listitem').filter({ hasText: /^[0-9A-Z]{4}(-[0-9A-Z]{4}){5}$/ })
  await expect(codes).toHaveCount(10)
  const recovery = await codes.first().innerText()
  await page.getByRole('button', { name: say('people.factor.kept') }).click()

  await signOut(page)
  await writePassword(page, email)
  await writeCode(page, '000000')
  await expect(page.getByText(say('problems.session.code_wrong'))).toBeVisible()
  // The step that set it up is spent; the next one is taken already, for clocks that drift.
  await writeCode(page, await generate({ secret, epoch: begun + STEP_S }))
  await expect(page).toHaveURL(/\/$/)

  await signOut(page)
  await writePassword(page, email)
  await writeCode(page, recovery)
  await expect(page).toHaveURL(/\/$/)
  const again = await page.request.post('/api/session', { headers: OURS, data: { email, password: SECRET, code: recovery } })
  expect(again.status()).toBe(401)
  await page.context().close()
})
