import type { Locator, Page } from '@playwright/test'
import { choose, field, segment } from '../e2e/support/controls.ts'
import { RecordForm } from '../e2e/support/recordForm.ts'
import { say } from '../e2e/support/words.ts'

async function fillWeather({ main }: RecordForm): Promise<void> {
  await field(main, say('records.weather.wind')).fill('1.6')
  await choose(main, say('records.weather.from'), 'NW')
  await field(main, say('records.weather.air')).fill('13.4')
  await field(main, say('records.weather.humidity')).fill('78')
}

async function closeLines({ main }: RecordForm): Promise<void> {
  const done = main.getByRole('button', { name: say('records.mix.done'), exact: true })
  if (await done.isVisible()) await done.click()
}

/** Scrolls something to the top of the page, or to its middle, as a thumb would. */
async function scrollTo(thing: Locator, block: 'start' | 'center'): Promise<void> {
  await thing.evaluate((element, place) => { element.scrollIntoView({ block: place }) }, block)
}

/** Ticks blocks of the demo farm by their codes. */
async function pickBlocks({ page, main }: RecordForm, ...codes: string[]): Promise<void> {
  await main.getByRole('button', { name: say('recordForm.pick.open') }).click()
  const list = page.getByRole('dialog', { name: say('recordForm.pick.title') })
  for (const code of codes) await list.getByRole('checkbox', { name: new RegExp(`^${code} `) }).check()
  await list.getByRole('button', { name: /^Add \d/ }).click()
}

/** On the desk: nettle ferment and potash soap on A3, the soap over its label, so that a stop bars Start. */
export async function fillSpray(page: Page): Promise<RecordForm> {
  const form = new RecordForm(page, false)
  const { main } = form
  await form.open()
  await pickBlocks(form, 'A3', 'A2')
  await field(main, say('records.plain.purpose.label')).fill('aphids on shoot tips')
  await form.setComponent(say('records.mix.unnamed', { number: 1 }), { material: 'Nettle ferment', lot: 'NF-31', kind: 'ratio', value: '20' })
  await form.addComponent()
  await form.setComponent(say('records.mix.unnamed', { number: 2 }), { material: 'Potash soap', lot: '26-018', kind: 'ratio', value: '40' })
  await form.setWater('700')
  await field(main, say('records.mix.carrierSource')).fill('Rain tank 2')
  await form.chooseSprayer('M2')
  await fillWeather(form)
  await closeLines(form)
  await scrollTo(main.getByRole('heading', { level: 1 }), 'center')
  return form
}

/** On the phone: leaf-mould extract drenched on V2, one full tank and a part load. */
export async function fillDrench(page: Page): Promise<RecordForm> {
  const form = new RecordForm(page, true)
  const { main } = form
  await form.open()
  await segment(main, say('records.method.drench'))
  await pickBlocks(form, 'V2')
  await form.setComponent(say('records.mix.unnamed', { number: 1 }), { material: 'Leaf-mould extract', lot: 'LM-12', kind: 'ratio', value: '20' })
  await form.setWater('456')
  await form.chooseSprayer('D1')
  await fillWeather(form)
  await closeLines(form)
  await scrollTo(main.getByText('V2', { exact: true }).last(), 'start')
  return form
}

interface Happened { code: string; start: string; end: string; litres: string }

/** What happened, this morning, block after block, with what was measured and the password typed. */
export async function fillHappened(form: RecordForm, lines: readonly Happened[]): Promise<void> {
  const { main } = form
  await form.step(2).click()
  for (const { code, start, end, litres } of lines) {
    await form.time('start', code).fill(start)
    await form.time('end', code).fill(end)
    await form.amount(code).fill(litres)
  }
  await form.password.fill('ten letters')
  await main.getByRole('heading', { level: 1 }).scrollIntoViewIfNeeded()
}

/** What is said of a stop that was sprayed all the same. */
export async function fillStop({ main }: RecordForm): Promise<void> {
  await field(main, say('records.stop.why')).fill('Measured twice into one load')
  await field(main, say('records.stop.told')).fill('Mirel Achter, Oaklode Review')
  await field(main, say('records.stop.done')).fill('Leaves rinsed at 07:10')
}
