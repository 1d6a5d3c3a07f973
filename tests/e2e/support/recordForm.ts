import type { Locator, Page } from '@playwright/test'
import { expect } from '@playwright/test'
import type { Block } from '../../../shared/contract/block.ts'
import { choose, field, segment } from './controls.ts'
import { PASSWORD } from './demoFarm.ts'
import type { Things } from './things.ts'
import { say } from './words.ts'

/** The form of a record, on desk and phone alike: acted on by what a person reads. */
export class RecordForm {
  readonly page: Page
  readonly main: Locator
  private readonly isPhone: boolean

  constructor(page: Page, isPhone: boolean) {
    this.page = page
    this.isPhone = isPhone
    // Once it is signed, the page is named by its number.
    this.main = page.getByRole('main', { name: new RegExp(`^(${say('records.newTitle')}|${say('records.title')} )`) })
  }

  async open(query = ''): Promise<void> {
    await this.page.goto(`/register/new${query}`)
    await expect(this.step(1)).toHaveAttribute('aria-current', 'step')
  }

  step(number: 1 | 2): Locator {
    return this.main.getByRole('button', { name: new RegExp(`^${number}\\s*${say(number === 1 ? 'records.steps.ready' : 'records.steps.happened').replace('?', '\\?')}`) })
  }

  /** The line of the mix that opens the fields of one ingredient, or of the water. */
  mixLine(name: string): Locator {
    const label = this.isPhone ? new RegExp(`^${name}`) : say('records.mix.change', { name })
    return this.page.getByRole('button', { name: label, exact: !this.isPhone })
  }

  /** Ticks blocks in the list and adds them, in that order. */
  async chooseBlocks(...blocks: readonly Block[]): Promise<void> {
    await this.main.getByRole('button', { name: new RegExp(`^(${say('recordForm.pick.open')}|${say('recordForm.pick.more')})$`) }).click()
    const list = this.page.getByRole('dialog', { name: say('recordForm.pick.title') })
    for (const { code, name } of blocks) await list.getByRole('checkbox', { name: new RegExp(`^${code} ${name}`) }).check()
    await list.getByRole('button', { name: /^Add \d/ }).click()
    await expect(list).toBeHidden()
  }

  async setWater(litres: string): Promise<void> {
    if (!this.isPhone) await this.openLine(say('records.mix.carrier'))
    await field(this.main, say('records.mix.carrierAmount')).fill(litres)
  }

  async setComponent(shown: string, wanted: { material: string; lot: string; kind: 'ratio' | 'perArea' | 'perTank'; value: string }): Promise<void> {
    await this.openLine(shown)
    await choose(this.main, say('records.mix.material'), wanted.material)
    await choose(this.main, say('records.mix.basis'), say(`recordForm.mix.choice.${wanted.kind === 'ratio' ? 'ratioTo' : wanted.kind}`))
    const labels = { ratio: 'records.mix.parts', perArea: 'records.mix.rate', perTank: 'recordForm.mix.label.perTank' } as const
    await field(this.main, say(labels[wanted.kind])).fill(wanted.value)
    await segment(this.main, new RegExp(`^${wanted.lot}`))
  }

  async addComponent(): Promise<void> {
    await this.main.getByRole('button', { name: say('records.mix.add') }).click()
  }

  async chooseSprayer(code: string): Promise<void> {
    await choose(this.main, say('records.sprayer.label'), code)
  }

  private async openLine(name: string): Promise<void> {
    const line = this.mixLine(name)
    if ((await line.getAttribute('aria-expanded')) !== 'true') await line.click()
    await expect(line).toHaveAttribute('aria-expanded', 'true')
  }

  /** A soil drench of one ingredient, 1 part to 20 of 200 L: whole, ready to start. */
  async fillDrench({ block, first, sprayer }: Things): Promise<void> {
    await segment(this.main, say('records.method.drench'))
    await this.chooseBlocks(block)
    await this.setComponent(say('records.mix.unnamed', { number: 1 }), { material: first.material.name, lot: first.lot.code, kind: 'ratio', value: '20' })
    await this.setWater('200')
    await this.chooseSprayer(sprayer.code)
  }

  get startButton(): Locator {
    return this.main.getByRole('button', { name: new RegExp(`^${say('records.ready.start')}`) })
  }

  async start(): Promise<void> {
    await expect(this.startButton).toBeEnabled()
    await this.startButton.click()
    await expect(this.step(2)).toHaveAttribute('aria-current', 'step')
  }

  async endNow(): Promise<void> {
    if (this.isPhone) {
      await this.main.getByRole('button', { name: /^Finish / }).click()
    } else {
      await this.main.getByRole('button', { name: new RegExp(`, end: ${say('records.happened.now')}$`) }).first().click()
    }
  }

  /** Start or end of a line. On a phone only the open line has fields. */
  time(at: 'start' | 'end', code: string): Locator {
    return field(this.main, this.isPhone ? say(`records.happened.${at}`) : say(`recordForm.line.${at}Of`, { code }))
  }

  /** On a phone: the row of a block, which opens its line. */
  row(code: string): Locator {
    return this.main.getByRole('button', { name: new RegExp(`^${code} `) })
  }

  /** The day of the work, YYYY-MM-DD. */
  async setDay(day: string): Promise<void> {
    await this.main.getByLabel(say('records.happened.day'), { exact: true }).fill(day)
  }

  /** The amount of a line, likewise. */
  amount(code: string): Locator {
    return field(this.main, this.isPhone ? say('records.happened.amount') : say('recordForm.line.amountOf', { code }))
  }

  get password(): Locator {
    return field(this.main, say('records.sign.password'))
  }

  get signButton(): Locator {
    return this.main.getByRole('button', { name: new RegExp(`^(${say('records.sign.sign')}|${say('records.sign.asItHappened')}|Sign \\d+ block lines)$`) })
  }

  async sign(password = PASSWORD): Promise<void> {
    await this.password.fill(password)
    await this.signButton.click()
  }

  /** The number it got. */
  async signedNumber(): Promise<string> {
    const said = this.page.getByRole('main').getByText(/^Signed as \d{4}-\d{4}\.$/)
    await expect(said).toBeVisible()
    return /\d{4}-\d{4}/.exec(await said.innerText())?.[0] ?? ''
  }

  /** The checks: beside the page, or the sheet the peek opens. */
  async checks(): Promise<Locator> {
    if (!this.isPhone) return this.page.getByRole('complementary', { name: say('frame.checks') })
    await this.page.getByRole('region', { name: say('frame.checks') }).getByRole('button').click()
    const sheet = this.page.getByRole('dialog', { name: say('frame.checks') })
    await expect(sheet).toBeVisible()
    return sheet
  }

  async closeChecks(): Promise<void> {
    if (!this.isPhone) return
    await this.page.keyboard.press('Escape')
    await expect(this.page.getByRole('dialog', { name: say('frame.checks') })).toBeHidden()
  }
}
