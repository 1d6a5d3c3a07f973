import { recordSchema } from '../../shared/contract/record.ts'
import { field, segment } from './support/controls.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { dayFromNow, makeBlock, makeLot, makeMaterial, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

test('a spray with a stop, over two blocks and past midnight, is signed as it happened', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const second = await makeBlock(manager)
  const material = await makeMaterial(manager, { label: { maxStrengthPct: '2', reEntryHours: '96', source: 'part 3' } })
  const first = { material, lot: await makeLot(manager, material.id) }
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await segment(form.main, say('records.method.foliar'))
  await form.chooseBlocks(things.block, second)
  // 1 part to 0 is refused at its field, in words.
  const wanted = { material: material.name, lot: first.lot.code, kind: 'ratio' as const }
  await form.setComponent(say('records.mix.unnamed', { number: 1 }), { ...wanted, value: '0' })
  await expect(form.main.getByText(say('recordForm.gap.ratioZero'))).toBeVisible()
  await field(form.main, say('records.mix.parts')).fill('20')
  await expect(form.main.getByText(say('recordForm.gap.ratioZero'))).toBeHidden()
  await form.setWater('200')
  await form.chooseSprayer(things.sprayer.code)
  await expect(form.startButton).toBeDisabled()

  await form.main.getByRole('button', { name: say('records.ready.already') }).click()
  await expect(form.step(2)).toHaveAttribute('aria-current', 'step')
  for (const { code } of [things.block, second]) {
    await form.row(code).click()
    await form.time('start', code).fill('23:50')
    await form.time('end', code).fill('00:20')
    // The end before the start is asked about, never moved in silence.
    const question = form.main.getByText(say('recordForm.line.endEarlier', { end: '00:20', start: '23:50' }))
    await expect(question).toBeVisible()
    await form.main.getByRole('button', { name: say('recordForm.line.wasNextDay', { end: '00:20' }) }).click()
    await expect(question).toBeHidden()
  }
  // A night that is over, whatever hour it is.
  await form.setDay(dayFromNow(-2))
  for (const name of ['why', 'told', 'done'] as const) await field(form.main, say(`records.stop.${name}`)).fill(`What stands under ${name}`)
  await expect(form.signButton).toHaveText(say('records.sign.asItHappened'))
  await form.sign()
  await form.signedNumber()
  await expect(form.main.getByText(say('records.signed.withStops', { count: 1 }))).toBeVisible()
  await form.main.getByRole('button', { name: say('records.signed.open') }).click()
  await expect(page).toHaveURL(/\/register\/[0-9a-f-]{36}$/)
  const record = await manager.get(`/records/${page.url().split('/').at(-1) ?? ''}`, recordSchema)
  expect(record.lines).toHaveLength(2)
  for (const { startedAt, endedAt } of record.lines) expect(Date.parse(endedAt ?? '') - Date.parse(startedAt ?? '')).toBe(30 * 60_000)
  expect(record.computed.lines.every(({ reEntryUntil }) => reEntryUntil !== null)).toBe(true)
  expect(record.checks.some(({ verdict, code }) => verdict === 'stop' && code === 'label.strength')).toBe(true)

  await page.getByRole('navigation', { name: say('frame.placesLabel') }).getByRole('link', { name: say('frame.places.today') }).click()
  const held = page.getByRole('region', { name: say('blocks.held.inForce') }).getByRole('listitem').filter({ hasText: things.block.code })
  await expect(held).toContainText(second.code)
  await expect(held).toContainText(/keep out until 00:20 on \d/)
})
