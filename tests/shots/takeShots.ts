import { execFile } from 'node:child_process'
import { mkdir, rm, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { chromium, expect, type Page } from '@playwright/test'
import { pageOf } from '../../shared/contract/common.ts'
import { registerRowSchema } from '../../shared/contract/record.ts'
import { sessionSchema } from '../../shared/contract/session.ts'
import { field } from '../e2e/support/controls.ts'
import { emailOf } from '../e2e/support/demoFarm.ts'
import { say } from '../e2e/support/words.ts'
import { findChromium } from '../../server/cli/lib/chromium.mjs'
import { fillDrench, fillHappened, fillSpray, fillStop } from './fillRecord.ts'
import { LATER_SCREENS } from './laterScreens.ts'
import { shoot, withPage, type Shooting, type Size } from './shooting.ts'

const run = promisify(execFile)
/** A4 as the design draws it. */
const PAGE_PX = { width: '1270', height: '1797' }
/** Names of the places at each size; the first four of the desk and Today of the phone are pictures of the design. */
const PLACES = [
  { path: '/', names: { desk: 'd-01-today', tablet: 't-today' } },
  { path: '/blocks', names: { desk: 'd-blocks', tablet: 't-blocks', phone: 'm-blocks' } },
  { path: '/blocks/new?by=draw', names: { desk: 'd-block-new', tablet: 't-block-new', phone: 'm-block-new' } },
  { path: '/register', names: { desk: 'd-04-register', tablet: 't-register', phone: 'm-register' } },
  { path: '/inputs', names: { desk: 'd-inputs', tablet: 't-inputs', phone: 'm-inputs' } },
  { path: '/rounds', names: { desk: 'd-05-season-sheet', tablet: 't-rounds', phone: 'm-rounds' } },
  { path: '/farm/people', names: { desk: 'd-people', tablet: 't-people', phone: 'm-people' } },
  { path: '/farm/journal', names: { desk: 'd-journal', tablet: 't-journal', phone: 'm-journal' } },
  { path: '/me', names: { desk: 'd-me', tablet: 't-me', phone: 'm-me' } },
  { path: '/farm', names: { desk: 'd-farm', tablet: 't-farm', phone: 'm-farm' } },
] as const

async function shootPlaces(shooting: Shooting, size: Size): Promise<void> {
  await withPage(shooting, { size, who: 'manager' }, async (page) => {
    for (const { path, names } of PLACES) {
      const name = Object.entries(names).find(([each]) => each === size)?.[1]
      if (name === undefined) continue
      await page.goto(path)
      await expect(page.getByRole('main')).toBeVisible()
      await shoot(page, shooting.folder, name)
    }
    if (size === 'phone') return
    await openBlock(page, 'A3')
    await shoot(page, shooting.folder, size === 'desk' ? 'd-02-blocks' : 't-block')
    await page.goto('/register')
    await page.getByRole('row').filter({ hasText: 'Potash soap' }).getByRole('link').first().click()
    await page.keyboard.press('Enter')
    await expect(page.getByRole('heading', { name: /^Record / })).toBeAttached()
    await shoot(page, shooting.folder, size === 'desk' ? 'd-record' : 't-record')
  })
}

async function openBlock(page: Page, code: string): Promise<void> {
  await page.goto('/blocks')
  await page.getByRole('rowheader', { name: new RegExp(`^${code} `) }).getByRole('link').click()
  await expect(page.getByRole('heading', { name: code, exact: true })).toBeVisible()
}

async function shootCover(shooting: Shooting, size: Size, name: string): Promise<void> {
  await withPage(shooting, { size }, async (page) => {
    await page.goto('/signin')
    await field(page, say('session.email')).fill(emailOf('manager'))
    await field(page, say('session.password')).fill('ten letters')
    await shoot(page, shooting.folder, name)
  })
}

async function shootRecords(shooting: Shooting): Promise<void> {
  for (const size of ['desk', 'tablet'] as const) {
    await withPage(shooting, { size, who: 'manager' }, async (page) => {
      const form = await fillSpray(page)
      await shoot(page, shooting.folder, size === 'desk' ? 'd-03-record-ready' : 't-record-ready')
      await fillHappened(form, [{ code: 'A3', start: '05:50', end: '06:36', litres: '374' }, { code: 'A2', start: '06:44', end: '07:37', litres: '412' }])
      await fillStop(form)
      await shoot(page, shooting.folder, size === 'desk' ? 'd-09-record-happened' : 't-record-happened')
    })
  }
  await withPage(shooting, { size: 'phone', who: 'applicator' }, async (page) => {
    const form = await fillDrench(page)
    await shoot(page, shooting.folder, 'm-02-record-mix')
    await fillHappened(form, [{ code: 'V2', start: '05:38', end: '06:12', litres: '474' }])
    await shoot(page, shooting.folder, 'm-06-happened')
  })
}

async function shootToday(shooting: Shooting, light: 'day' | 'dawn', name: string): Promise<void> {
  await withPage(shooting, { size: 'phone', who: 'applicator', light }, async (page) => {
    await page.goto('/')
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
    await shoot(page, shooting.folder, name)
  })
}

async function shootCertifier(shooting: Shooting): Promise<void> {
  await withPage(shooting, { size: 'desk', who: 'certifier' }, async (page) => {
    await page.goto('/farms')
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
    await shoot(page, shooting.folder, 'd-07-my-farms')
  })
}

/** The farm that the manager of the demo leads, as its address. */
async function farmAddress(page: Page): Promise<string> {
  const session = sessionSchema.parse(await (await page.request.get('/api/session')).json())
  return `/api/farms/${session.memberships[0]?.farmId}`
}

/** A page of a PDF as it prints. */
async function shootPage({ folder }: Shooting, page: Page, { address, number, name }: { address: string; number: number; name: string }): Promise<void> {
  const pdf = await page.request.get(address)
  expect(pdf.status()).toBe(200)
  const file = join(folder, name)
  await writeFile(`${file}.pdf`, await pdf.body())
  await run('pdftoppm', ['-f', String(number), '-l', String(number), '-singlefile', '-png', '-scale-to-x', PAGE_PX.width, '-scale-to-y', PAGE_PX.height, `${file}.pdf`, file])
  await rm(`${file}.pdf`)
  process.stdout.write(`${name}.png\n`)
}

/** The first pages of a signed record and of the season report. */
async function shootPaper(shooting: Shooting): Promise<void> {
  await withPage(shooting, { size: 'desk', who: 'manager' }, async (page) => {
    const farm = await farmAddress(page)
    const rows = pageOf(registerRowSchema).parse(await (await page.request.get(`${farm}/records?limit=200`)).json()).items
    const row = rows.find(({ state, preparations }) => state === 'signed' && preparations.includes('Potash soap'))
    await shootPage(shooting, page, { address: `${farm}/records/${row?.id}/pdf`, number: 1, name: 'p-01-record' })
    await shootPage(shooting, page, { address: `${farm}/seasons/${row?.season}/pdf`, number: 1, name: 'p-02-season-report' })
  })
}

const [url, password, folder] = process.argv.slice(2)
if (url === undefined || password === undefined || folder === undefined) throw new Error('Usage: takeShots.ts URL PASSWORD DIR')
await mkdir(folder, { recursive: true })
const browser = await chromium.launch({ executablePath: findChromium() ?? '', args: ['--disable-quic', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--no-first-run'] })
const shooting = { browser, url, password, folder }
try {
  await shootCover(shooting, 'desk', 'd-08-signin')
  await shootCover(shooting, 'phone', 'm-signin')
  for (const size of ['desk', 'tablet', 'phone'] as const) await shootPlaces(shooting, size)
  await shootRecords(shooting)
  await shootToday(shooting, 'day', 'm-01-today')
  await shootToday(shooting, 'dawn', 'm-05-dawn')
  await shootCertifier(shooting)
  await shootPaper(shooting)
  for (const [name, why] of Object.entries(LATER_SCREENS)) process.stdout.write(`Not yet: ${name} (${why})\n`)
} finally {
  await browser.close()
}
