import { execFileSync } from 'node:child_process'
import type { Page } from '@playwright/test'
import { blockSchema, type Block } from '../../shared/contract/block.ts'
import { pageOf } from '../../shared/contract/common.ts'
import { sessionSchema } from '../../shared/contract/session.ts'
import { BlockForm, typedPoints } from './support/blockForm.ts'
import { choose, field, segment } from './support/controls.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

const PASSWORD = 'thirteen green apples'
const [MATERIAL, LOT] = ['Nettle ferment', 'N-1']

/** The one-time link that `npm run owner` prints. */
function ownerLink(email: string, url: string): string {
  const { E2E_DATABASE_URL, E2E_DATABASE_OWNER_URL } = process.env
  const database = E2E_DATABASE_URL === undefined ? {} : { DATABASE_URL: E2E_DATABASE_URL, DATABASE_OWNER_URL: E2E_DATABASE_OWNER_URL }
  const printed = execFileSync(process.execPath, ['server/cli/owner.mjs', email], { env: { ...process.env, ...database, PUBLIC_URL: url }, encoding: 'utf8', stdio: ['ignore', 'pipe', 'inherit'] })
  return printed.split('\n').find((line) => line.includes('/welcome/')) ?? ''
}

async function firstBlock(page: Page): Promise<Block> {
  const { memberships } = sessionSchema.parse(await (await page.request.get('/api/session')).json())
  const { items } = pageOf(blockSchema).parse(await (await page.request.get(`/api/farms/${memberships[0]?.farmId ?? ''}/blocks`)).json())
  const [block] = items
  if (!block) throw new Error('The farm has no block')
  return block
}

/** The first material and a lot of it, from the page of the inputs. */
async function makeInputs(page: Page): Promise<void> {
  await page.goto('/inputs')
  await page.getByRole('button', { name: say('inputs.newMaterial') }).first().click()
  const writing = page.getByRole('dialog', { name: say('inputs.form.materialTitle') })
  await field(writing, say('inputs.form.name')).fill(MATERIAL)
  await choose(writing, say('inputs.form.kind'), say('inputs.kind.ferment'))
  await segment(writing, say('inputs.measure.volume'))
  await segment(writing, say('inputs.status.allowed'))
  await field(writing, say('inputs.form.basis')).fill('System plan, line 3')
  await writing.getByRole('button', { name: say('inputs.form.materialSave') }).click()
  await expect(writing).toBeHidden()
  await page.getByRole('row').filter({ hasText: MATERIAL }).getByRole('button', { name: say('inputs.receiveLot') }).click()
  const receiving = page.getByRole('dialog', { name: say('inputs.form.lotTitle') })
  await field(receiving, say('inputs.form.code')).fill(LOT)
  await field(receiving, say('inputs.form.quantity')).fill('40')
  await segment(receiving, say('inputs.origin.made'))
  await receiving.getByRole('button', { name: say('inputs.form.lotSave') }).click()
  await expect(receiving).toBeHidden()
}

test('a new owner comes from the one-time link to a first signed record, and opens a practice farm beside it', async ({ page, isPhone, baseURL }) => {
  const name = unique('Farm ')
  await page.goto(ownerLink(`${unique('owner').toLowerCase()}@demo.test`, baseURL ?? ''))
  await field(page, say('session.welcome.name')).fill('Ines Marl')
  await field(page, say('session.welcome.newPassword')).fill(PASSWORD)
  await page.getByRole('button', { name: say('session.welcome.accept') }).click()
  await field(page, say('farm.make.name')).fill(name)
  await page.getByRole('button', { name: say('farm.make.save') }).click()
  await expect(page).toHaveURL(/\/start$/)
  const main = page.getByRole('main')

  await field(main, say('start.place.latitude')).fill('44.61')
  await field(main, say('start.place.longitude')).fill('-123.31')
  await main.getByRole('button', { name: say('start.steps.place.action') }).click()
  await main.getByRole('button', { name: say('start.steps.profile.action') }).click()
  await expect(main.getByText(say('start.progress', { done: 2, all: 6 }))).toBeVisible()

  await main.getByRole('link', { name: say('start.steps.block.action') }).click()
  const block = new BlockForm(page)
  await block.open('points')
  await block.points.fill(typedPoints([[-123.31, 44.61], [-123.309, 44.61], [-123.309, 44.611], [-123.31, 44.611]]))
  await block.name('A1')
  await block.saveButton.click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)

  // The page that the step led to leads back; what does not fit is passed over.
  await main.getByRole('link', { name: say('start.open') }).click()
  await expect(main.getByText(say('start.progress', { done: 3, all: 6 }))).toBeVisible()
  await makeInputs(page)
  const form = new RecordForm(page, isPhone)
  await form.open()
  await segment(form.main, say('records.method.drench'))
  await form.chooseBlocks(await firstBlock(page))
  await form.setComponent(say('records.mix.unnamed', { number: 1 }), { material: MATERIAL, lot: LOT, kind: 'ratio', value: '20' })
  await form.setWater('200')
  await form.start()
  await form.endNow()
  await form.sign(PASSWORD)
  expect(await form.signedNumber()).toMatch(/^\d{4}-0001$/)

  await page.goto('/start')
  await expect(main.getByText(say('start.progress', { done: 5, all: 6 }))).toBeVisible()
  await main.getByRole('button', { name: say('start.skip') }).click()
  await expect(main.getByText(say('start.allDone'))).toBeVisible()
  await main.getByRole('button', { name: say('start.practice.open') }).click()
  await expect(page).toHaveURL(/\/$/)
  await page.goto('/farm')
  await expect(page.getByText(say('start.practice.mark'))).toBeVisible()
})
