import { randomUUID } from 'node:crypto'
import type { APIRequestContext, Browser, Page } from '@playwright/test'
import { translate } from '../../shared/messages/translate.ts'
import { OURS, PASSWORD, signInTo } from './support/demoFarm.ts'
import { linkTo } from './support/letters.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

const NEW = 'hojas mojadas al alba'
const es = (id: string, params: Record<string, string | number> = {}): string => translate('es', id, params)

/** A farm of the owner's own, so that nobody else's people change. */
async function makeFarm(request: APIRequestContext): Promise<{ id: string; name: string }> {
  await signInTo(request, 'owner')
  const farm = { id: randomUUID(), name: `Zz ${unique('farm ')}` }
  expect((await request.post('/api/farms', { headers: OURS, data: { ...farm, zone: 'America/Los_Angeles', seasonStart: '03-01' } })).status()).toBe(201)
  return farm
}

async function openStranger(browser: Browser): Promise<Page> {
  return (await browser.newContext({ baseURL: test.info().project.use.baseURL ?? '' })).newPage()
}

test('an owner invites by letter, and somebody new takes the invitation in Spanish', async ({ page, browser, context }) => {
  const farm = await makeFarm(context.request)
  const email = `${unique('ana')}@finca.example`.toLowerCase()
  await context.addInitScript((id) => { localStorage.setItem('drenchleaf.farm', id) }, farm.id)
  await page.goto('/farm/people')
  await page.getByRole('button', { name: say('letters.invite.open'), exact: true }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel(say('letters.invite.email'), { exact: true }).fill(email)
  await dialog.getByLabel(say('letters.invite.name')).fill('Ana')
  await dialog.getByText(say('session.role.manager'), { exact: true }).click()
  await dialog.getByText('Español').click()
  await dialog.getByRole('button', { name: say('letters.invite.send') }).click()
  await expect(dialog.getByText(say('letters.invite.passwordNeeded'))).toBeVisible()
  await dialog.getByLabel(say('letters.invite.password'), { exact: true }).fill(PASSWORD)
  await dialog.getByRole('button', { name: say('letters.invite.send') }).click()
  await expect(page.getByRole('button', { name: `${say('letters.pending.withdraw')}, ${email}` })).toBeVisible()

  const invited = await openStranger(browser)
  await invited.goto(await linkTo(context.request, email, es('mail.invitation.subject', { farm: farm.name })))
  await expect(invited.getByText(es('letters.join.title', { farm: farm.name }))).toBeVisible()
  await expect(invited.locator('html')).toHaveAttribute('lang', 'es')
  await expect(invited.getByLabel(es('session.welcome.name'))).toHaveValue('Ana')
  await invited.getByLabel(es('session.welcome.name')).fill('Ana Robles')
  await invited.getByLabel(es('session.welcome.newPassword'), { exact: true }).fill(NEW)
  await invited.getByRole('button', { name: es('session.welcome.accept') }).click()
  await expect(invited).toHaveURL(/\/$/)
  await expect(invited.getByRole('navigation').first()).toContainText(es('frame.places.blocks'))
  await invited.goto('/me')
  await Promise.all([invited.waitForResponse((answer) => answer.url().endsWith('/api/me') && answer.ok()), invited.getByText(es('profile.unitsShort.us'), { exact: true }).click()])
  await invited.goto('/register/new')
  await expect(invited.getByLabel(es('common.unitOf', { label: es('records.weather.wind') }))).toHaveValue('mph')
  await invited.context().close()

  await page.goto('/farm/people')
  await expect(page.getByText('Ana Robles')).toBeVisible()
  await expect(page.getByText(say('letters.pending.title'))).toHaveCount(0)
  await page.goto('/farm/mail')
  await expect(page.getByRole('row', { name: new RegExp(email) })).toContainText(say('letters.state.sent'))
})

test('who has an account takes an invitation signed in, and renews a forgotten password by letter', async ({ browser, context }) => {
  const farms = [await makeFarm(context.request), await makeFarm(context.request)]
  const email = `${unique('bo')}@farm.example`.toLowerCase()
  const invite = async ({ id, name }: { id: string; name: string }): Promise<string> => {
    const data = { id: randomUUID(), email, role: 'applicator', language: 'en' }
    expect((await context.request.post(`/api/farms/${id}/invitations`, { headers: OURS, data })).status()).toBe(201)
    return linkTo(context.request, email, say('mail.invitation.subject', { farm: name }))
  }
  const [first, second] = farms
  if (!first || !second) throw new Error('two farms were made')
  const token = (await invite(first)).split('/').at(-1)
  expect((await context.request.post('/api/welcome', { headers: OURS, data: { token, name: 'Bo', password: NEW } })).status()).toBe(204)

  const page = await openStranger(browser)
  await page.goto('/signin')
  await page.getByRole('link', { name: say('session.forgot') }).click()
  await expect(page).toHaveURL(/\/reset$/)
  await expect(page.getByRole('button', { name: say('letters.reset.send') })).toBeVisible()
  await page.getByLabel(say('session.email')).fill(email)
  await page.getByRole('button', { name: say('letters.reset.send') }).click()
  await expect(page.getByText(say('letters.reset.asked'))).toBeVisible()
  await page.goto(await linkTo(context.request, email, say('mail.passwordReset.subject')))
  await page.getByLabel(say('session.welcome.newPassword'), { exact: true }).fill('another fine sentence')
  await page.getByRole('button', { name: say('letters.reset.save') }).click()
  await expect(page.getByText(say('letters.reset.done'))).toBeVisible()
  await expect(page).toHaveURL(/\/reset$/)

  await page.goto(await invite(second))
  await page.getByRole('button', { name: say('letters.join.signIn') }).click()
  await expect(page.getByRole('button', { name: say('session.openRegister') })).toBeVisible()
  await page.getByLabel(say('session.email')).fill(email)
  await page.getByLabel(say('session.password'), { exact: true }).fill('another fine sentence')
  await page.getByRole('button', { name: say('session.openRegister') }).click()
  await page.getByRole('button', { name: say('letters.join.take', { farm: second.name }) }).click()
  await expect(page).toHaveURL(/\/$/)
  const { memberships } = (await (await page.request.get('/api/session')).json()) as { memberships: { farmName: string }[] }
  expect(memberships.map(({ farmName }) => farmName).sort()).toEqual([first.name, second.name].sort())
  await page.context().close()
})
