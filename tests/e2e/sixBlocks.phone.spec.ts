import type { Page } from '@playwright/test'
import { recordSchema } from '../../shared/contract/record.ts'
import { RecordForm } from './support/recordForm.ts'
import { expect, test } from './support/test.ts'
import { makeBlock, makeThings } from './support/things.ts'
import { say } from './support/words.ts'

/** Presses of a person, counted by the page itself: one press that acts, one field that takes letters. */
async function countPresses(page: Page): Promise<() => Promise<{ taps: number; typed: number }>> {
  await page.evaluate(() => {
    const seen = { taps: 0, typed: 0 }
    Object.assign(window, { seenPresses: seen })
    const isField = (target: EventTarget | null): boolean => target instanceof HTMLInputElement && !['checkbox', 'radio'].includes(target.type)
    document.addEventListener('pointerup', () => { seen.taps += 1 }, true)
    document.addEventListener('focusin', ({ target }) => { if (isField(target)) seen.typed += 1 }, true)
  })
  return () => page.evaluate(() => (window as unknown as { seenPresses: { taps: number; typed: number } }).seenPresses)
}

test('six blocks from one tank are one record, three presses and nothing typed for each further block', async ({ page, isPhone, signInAs, manager }) => {
  const things = await makeThings(manager)
  const blocks = [things.block]
  for (let more = 0; more < 5; more += 1) blocks.push(await makeBlock(manager))
  const [first, ...others] = blocks
  await signInAs('manager')
  const form = new RecordForm(page, isPhone)
  await form.open()
  await form.fillDrench(things)
  const presses = await countPresses(page)

  await form.chooseBlocks(...others)
  await expect(form.main.getByText(first?.code ?? '', { exact: true }).first()).toBeVisible()
  // Opening the list and adding what was ticked are two presses for all of them.
  expect(await presses()).toEqual({ taps: 2 + others.length, typed: 0 })

  await form.start()
  const before = await presses()
  for (const [at, { code }] of blocks.entries()) {
    if (at > 0) await form.main.getByRole('button', { name: say('records.ready.startBlock', { code }) }).click()
    await form.main.getByRole('button', { name: say('recordForm.line.finish', { code }) }).click()
  }
  const after = await presses()
  expect({ taps: after.taps - before.taps, typed: after.typed - before.typed }).toEqual({ taps: 2 * blocks.length - 1, typed: 0 })

  // The last of them was not sprayed after all: it is left out, put back, and left out again.
  const last = blocks.at(-1)?.code ?? ''
  await form.row(last).click()
  await form.main.getByRole('button', { name: say('recordForm.line.notSprayed') }).click()
  await expect(form.main.getByText(say('recordForm.line.notSprayed')).last()).toBeVisible()

  // One line was measured: the others keep their share of the tank.
  await form.row(first?.code ?? '').click()
  await form.amount(first?.code ?? '').fill('41')
  await page.reload()
  await form.row(first?.code ?? '').click()
  await expect(form.amount(first?.code ?? '')).toHaveValue('41')
  await form.sign()
  const number = await form.signedNumber()
  await form.main.getByRole('button', { name: say('records.signed.open') }).click()
  await expect(page).toHaveURL(/\/register\/[0-9a-f-]{36}$/)
  const record = await manager.get(`/records/${page.url().split('/').at(-1) ?? ''}`, recordSchema)
  expect(record).toMatchObject({ number, state: 'signed' })
  expect(record.lines.map(({ blockId }) => blockId)).toEqual(blocks.slice(0, 5).map(({ id }) => id))
  expect(record.lines[0]?.amount).toEqual({ value: '41', unit: 'L', known: 'measured' })
  // 210 L over five blocks of one size.
  expect(record.lines[1]?.amount).toMatchObject({ value: '42', unit: 'L', known: 'workedOut' })
  for (const line of record.lines) expect(Date.parse(line.endedAt ?? '')).toBeGreaterThanOrEqual(Date.parse(line.startedAt ?? ''))
})
