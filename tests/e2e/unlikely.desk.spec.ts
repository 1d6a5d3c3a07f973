import { dayFromNow, listBlocks, makeLot, makeMaterial, makeThings } from './support/things.ts'
import { BlockForm, extentOf, typedPoints } from './support/blockForm.ts'
import { field } from './support/controls.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say, saying } from './support/words.ts'

test('an overlap is asked about, and saved with its reason', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const under = (await listBlocks(manager)).find(({ code }) => code === 'A3')
  const ring = under?.geometry.type === 'Polygon' ? (under.geometry.coordinates[0] ?? []) : []
  const form = new BlockForm(page)
  await form.open('points')
  await form.points.fill(typedPoints(ring))
  const code = unique('O')
  await form.name(code)
  await form.saveButton.click()
  await expect(form.main.getByText(say('problems.geometry.overlap', { code: 'A3', areaHa: '0.94', areaUnit: 'ha' })).filter({ visible: true }).first()).toBeVisible()
  await form.saveButton.click()
  const reasons = form.main.getByRole('textbox', { name: say('blocks.unlikely.reason') })
  await expect(form.main.getByText(say('blocks.unlikely.reasonNeeded')).first()).toBeVisible()
  for (const reason of await reasons.all()) await reason.fill('Undersown with clover, kept as a block of its own')
  await form.saveButton.click()
  await expect(page).toHaveURL(/\/blocks\/[0-9a-f-]{36}$/)
  expect((await listBlocks(manager)).some((block) => block.code === code)).toBe(true)
})

test('an outline that crosses itself is refused in words', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const form = new BlockForm(page)
  const { west, north } = extentOf(await listBlocks(manager))
  await form.open('points')
  const top = north + 0.002
  await form.points.fill(typedPoints([[west, top], [west + 0.001, top + 0.001], [west + 0.001, top], [west, top + 0.001]]))
  await expect(form.main.getByRole('alert').filter({ hasText: saying('blocks.draw.crossing') }).first()).toBeVisible()
  const code = unique('X')
  await form.name(code)
  await form.saveButton.click()
  await expect(form.main.getByRole('alert').filter({ hasText: saying('blocks.draw.crossing') })).toHaveCount(2)
  expect((await listBlocks(manager)).some((block) => block.code === code)).toBe(false)
})

test('a stop bars Start and never the signature: why, whom you tell, what was done', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const material = await makeMaterial(manager, { label: { maxStrengthPct: '2', source: 'part 3' } })
  const first = { material, lot: await makeLot(manager, material.id) }
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  // 1 part to 20 is 4.8 % of the spray; the label allows 2 %.
  await form.fillDrench({ ...things, first })
  await expect(form.startButton).toBeDisabled()
  await expect(form.startButton).toHaveText(say('records.ready.clear', { count: 1 }))
  const checks = await form.checks()
  await expect(checks.getByText(/10\sL in 210\sL is 4\.76\d*\s%\. The label allows at most 2\s%\./)).toBeVisible()
  await form.closeChecks()

  await form.main.getByRole('button', { name: say('records.ready.alreadyDrench') }).click()
  await expect(form.step(2)).toHaveAttribute('aria-current', 'step')
  for (const [day, words] of [['2062-06-16', 'recordForm.gap.dayToCome'], ['1926-06-16', 'problems.date.years']] as const) {
    await form.setDay(day)
    await expect(form.main.getByRole('alert').filter({ hasText: say(words) })).toHaveCount(1)
  }
  // A day that is over, whatever hour it is.
  await form.setDay(dayFromNow(-2))
  await expect(form.main.getByText(say('problems.date.years'))).toHaveCount(0)
  const [start, end] = [form.time('start', things.block.code), form.time('end', things.block.code)]
  await start.fill('00:10')
  await end.fill('00:40')
  await field(form.main, say('records.sign.password')).fill('not looked at yet')
  await form.signButton.click()
  await expect(form.signButton).toHaveText(say('records.sign.asItHappened'))
  await expect(form.main.getByText(say('records.stop.needed')).first()).toBeVisible()
  await field(form.main, say('records.stop.why')).fill('Measured twice')
  await field(form.main, say('records.stop.told')).fill('The certifier, by telephone')
  await field(form.main, say('records.stop.done')).fill('Rinsed with clear water')
  await form.sign()
  const number = await form.signedNumber()
  await expect(form.main.getByText(say('records.signed.withStops', { count: 1 }))).toBeVisible()
  await form.main.getByRole('button', { name: say('records.signed.open') }).click()
  await expect(page).toHaveURL(/\/register\/[0-9a-f-]{36}$/)
  await expect(page.getByRole('main').getByText(number).or(page.getByRole('heading', { name: say('records.read.head', { number }) })).first()).toBeAttached()
  await expect(page.getByText(/Why: Measured twice; told: The certifier, by telephone; done: Rinsed with clear water/)).toBeVisible()
})
