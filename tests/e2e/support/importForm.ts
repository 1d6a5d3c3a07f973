import { randomUUID } from 'node:crypto'
import type { BrowserContext, Locator, Page } from '@playwright/test'
import { expect } from '@playwright/test'
import { blockSchema, type Block } from '../../../shared/contract/block.ts'
import { pageOf } from '../../../shared/contract/common.ts'
import { farmSchema } from '../../../shared/contract/farm.ts'
import { OURS, signInTo } from './demoFarm.ts'
import { say } from './words.ts'

/** A farm of its own, without a block, open in this browser. @returns its id. */
export async function openNewFarm(context: BrowserContext): Promise<string> {
  await signInTo(context.request, 'neighbour')
  const answer = await context.request.post('/api/farms', {
    headers: OURS, data: { id: randomUUID(), name: 'Import farm', zone: 'America/Los_Angeles', seasonStart: '01-01' },
  })
  expect(answer.status(), await answer.text()).toBe(201)
  const { id } = farmSchema.parse(await answer.json())
  await context.addInitScript((farmId) => { localStorage.setItem('drenchleaf.farm', farmId) }, id)
  return id
}

export async function blocksOf(context: BrowserContext, farmId: string): Promise<Block[]> {
  const answer = await context.request.get(`/api/farms/${farmId}/blocks?limit=200`)
  return pageOf(blockSchema).parse(await answer.json()).items
}

/** The page that imports blocks. */
export class ImportForm {
  readonly page: Page
  readonly main: Locator

  constructor(page: Page) {
    this.page = page
    this.main = page.getByRole('main', { name: say('importing.title') })
  }

  async open(): Promise<void> {
    await this.page.goto('/blocks/import')
    await expect(this.main.getByRole('button', { name: say('importing.choose') })).toBeVisible()
  }

  async choose(file: string | { name: string; mimeType: string; buffer: Buffer }): Promise<void> {
    await this.main.locator('input[data-import]').setInputFiles(typeof file === 'string' ? `tests/fixtures/import/${file}` : file)
  }

  count(read: number, taken: number, refused: number, left: number): Locator {
    return this.main.getByText(say('importing.count', { read, taken, refused, left }))
  }

  shape(number: number): Locator {
    return this.main.locator(`[data-shape="${number}"]`)
  }

  get importButton(): Locator {
    return this.main.getByRole('button', { name: /^Import \d+ blocks?$/ })
  }
}
