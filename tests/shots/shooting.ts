import { join } from 'node:path'
import type { Browser, BrowserContextOptions, Page } from '@playwright/test'
import { signInTo, type Who } from '../e2e/support/demoFarm.ts'

/** The moment of every picture; the server under it stands at the same. */
const FIXED_CLOCK = '2026-06-16T13:42:00Z'

const SIZES = {
  desk: { viewport: { width: 1440, height: 900 } },
  tablet: { viewport: { width: 1024, height: 768 } },
  phone: { viewport: { width: 390, height: 844 }, deviceScaleFactor: 2, hasTouch: true, isMobile: true },
} satisfies Record<string, BrowserContextOptions>
export type Size = keyof typeof SIZES

export interface Shooting {
  browser: Browser
  url: string
  password: string
  folder: string
}

interface Setting {
  size: Size
  who?: Who
  light?: 'day' | 'dawn'
}

/** A page of its own at the fixed moment, signed in as `who`; closed when `use` is done. */
export async function withPage({ browser, url, password }: Shooting, { size, who, light = 'day' }: Setting, use: (page: Page) => Promise<void>): Promise<void> {
  const context = await browser.newContext({ baseURL: url, locale: 'en-US', timezoneId: 'America/Los_Angeles', reducedMotion: 'reduce', ...SIZES[size] })
  if (who !== undefined) await signInTo(context.request, who, password)
  await context.addInitScript((chosen) => { localStorage.setItem('drenchleaf.light', chosen) }, light)
  const page = await context.newPage()
  page.setDefaultTimeout(20_000)
  await page.clock.setFixedTime(FIXED_CLOCK)
  await use(page)
  await context.close()
}

/** Writes the picture once fonts, requests and tiles are there; nothing blinks in it. */
export async function shoot(page: Page, folder: string, name: string): Promise<void> {
  await page.waitForLoadState('networkidle')
  await page.mouse.move(0, 0)
  await page.evaluate(async () => {
    if (document.activeElement instanceof HTMLElement) document.activeElement.blur()
    await document.fonts.ready
  })
  await page.screenshot({ path: join(folder, `${name}.png`), animations: 'disabled', caret: 'hide' })
  process.stdout.write(`${name}.png\n`)
}
