import { pageOf } from '../../shared/contract/common.ts'
import { jobSchema, type Job } from '../../shared/contract/job.ts'
import { seasonPlanSchema } from '../../shared/contract/seasonPlan.ts'
import { choose, field, segment } from './support/controls.ts'
import { RecordForm } from './support/recordForm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { dayFromNow, makeBlock, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

test('a plan is made; a job is moved, one is done from its record, another is skipped with its reason', async ({ page, context, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const second = await makeBlock(manager)
  const [one, other] = [things.block, second]
  const name = unique('Rounds ')
  await signInAs('manager')

  await openScreen(page, '/rounds')
  await page.getByRole('button', { name: say('rounds.newPlan') }).click()
  const form = page.getByRole('main', { name: say('rounds.form.newTitle') })
  await field(form, say('rounds.form.name')).fill(name)
  await segment(form, say('frame.method.drench'))
  await choose(form, say('rounds.form.preparation'), things.first.material.name)
  await choose(form, say('rounds.form.size'), say('rounds.form.sizeWater'))
  await field(form, say('records.mix.carrierAmount')).fill('200')
  await form.getByRole('button', { name: say('rounds.form.addBlocks') }).click()
  const picker = page.getByRole('dialog', { name: say('recordForm.pick.title') })
  for (const block of [one, other]) await picker.getByRole('checkbox', { name: new RegExp(`^${block.code} `) }).check()
  await picker.getByRole('button', { name: /^Add \d/ }).click()
  await form.getByLabel(say('rounds.form.first')).fill(dayFromNow(0))
  await form.getByRole('button', { name: say('rounds.form.save') }).click()
  await expect(form.getByText(say('problems.field.required'))).toBeVisible()
  await form.getByLabel(say('rounds.form.last')).fill(dayFromNow(60))
  await expect(form.getByText(/^5 rounds on 2 blocks/)).toBeVisible()
  await form.getByRole('button', { name: say('rounds.form.save') }).click()
  await expect(page.getByRole('main', { name: say('rounds.title') })).toBeVisible()
  const { items: plans } = await manager.get('/season-plans?limit=200', pageOf(seasonPlanSchema))
  const plan = plans.find((each) => each.name === name)
  const job = async (code: string, state?: Job['state']): Promise<Job | undefined> => {
    const { items } = await manager.get(`/jobs?limit=200&planId=${plan?.id ?? ''}`, pageOf(jobSchema))
    return items.find(({ blockCode, ...each }) => blockCode === code && (state === undefined || each.state === state))
  }

  const card = page.getByRole('dialog')
  const openJob = async (code: string): Promise<void> => {
    await page.getByRole('main').getByRole('button', { name: new RegExp(`^${code} ${say('rounds.state.due')}`, 'i') }).first().click()
    await expect(card).toBeVisible()
  }
  await openJob(other.code)
  await card.getByRole('button', { name: say('rounds.job.move') }).click()
  await card.getByLabel(say('rounds.job.moveDay')).fill(dayFromNow(30))
  await card.getByRole('button', { name: say('rounds.job.moveSave') }).click()
  await expect(card.getByRole('alert')).toContainText('outside the days of this job')
  await field(card, say('rounds.job.why')).fill('The brew is ready then')
  await card.getByRole('button', { name: say('rounds.job.moveSave') }).click()
  await expect(card.getByText(say('rounds.job.outside'))).toBeVisible()
  expect((await job(other.code))?.plannedOn).toBe(dayFromNow(30))

  await card.getByRole('button', { name: say('rounds.job.skip') }).click()
  await card.getByRole('button', { name: say('rounds.job.skipSave') }).click()
  await expect(card.getByText(say('problems.text.required'))).toBeVisible()
  await field(card, say('rounds.job.skipReason')).fill('Picking all week')
  await card.getByRole('button', { name: say('rounds.job.skipSave') }).click()
  await expect(card.getByText(/^Skipped by .*: Picking all week$/)).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(card).toBeHidden()

  // A day chosen without signal is judged when there is one; what was refused says which job it was of.
  await openJob(one.code)
  await context.setOffline(true)
  await card.getByRole('button', { name: say('rounds.job.move') }).click()
  await card.getByLabel(say('rounds.job.moveDay')).fill(dayFromNow(30))
  await card.getByRole('button', { name: say('rounds.job.moveSave') }).click()
  await expect(card.getByText(say('rounds.job.kept'))).toBeVisible()
  await page.keyboard.press('Escape')
  await expect(card).toBeHidden()
  await context.setOffline(false)
  await page.getByRole('button', { name: say('frame.sync.needsYou', { count: 1 }) }).filter({ visible: true }).click()
  await expect(card).toContainText(`${one.code}, ${things.first.material.name}`)
  await expect(card.getByText(/^From \d+ .* to \d+ /)).toBeVisible()
  await expect(card).toContainText('outside the days of this job')
  await card.getByRole('link', { name: say('rounds.kept.sheet') }).click()
  await expect(card).toBeHidden()

  await openJob(one.code)
  await card.getByRole('button', { name: say('rounds.job.open') }).click()
  const record = new RecordForm(page, isPhone)
  await expect(record.step(1)).toHaveAttribute('aria-current', 'step')
  await expect(record.main.getByText(one.code, { exact: true }).first()).toBeVisible()
  await expect(record.main.getByText(things.first.material.name).first()).toBeVisible()
  await record.chooseSprayer(things.sprayer.code)
  await record.start()
  await record.endNow()
  await record.sign()
  const number = await record.signedNumber()
  expect(await job(one.code, 'done')).toMatchObject({ number: 1, done: { number } })

  await openScreen(page, '/rounds')
  await page.getByRole('main').getByRole('button', { name: new RegExp(`^${one.code} ${say('rounds.state.done')}`, 'i') }).first().click()
  await expect(card.getByRole('link', { name: say('rounds.panel.openRecord', { number }) })).toBeVisible()
})
