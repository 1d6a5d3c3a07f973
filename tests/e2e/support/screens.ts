import type { Page } from '@playwright/test'
import { pageOf } from '../../../shared/contract/common.ts'
import { siteSchema } from '../../../shared/contract/ground.ts'
import type { ApplicationRecord } from '../../../shared/contract/record.ts'
import { signInTo, type FarmApi, type Who } from './demoFarm.ts'
import { settled } from './settled.ts'
import { makeSignedRecord, makeThings } from './things.ts'

/** A screen, who looks at it, and its address. */
export interface Screen {
  name: string
  who: Who | null
  path: string
}

/** Every screen of the product; of a block and of a record, one made for it. */
export async function listScreens(manager: FarmApi): Promise<Screen[]> {
  const things = await makeThings(manager)
  const record: ApplicationRecord = await makeSignedRecord(manager, things)
  const open = [
    { name: 'sign-in', path: '/signin' },
    { name: 'welcome', path: '/welcome' },
    { name: 'a new password', path: '/reset' },
    { name: 'check a code', path: '/check' },
    { name: 'a code that agrees', path: `/check/${record.digest?.slice(0, 20) ?? ''}` },
  ]
  const ofManager = [
    { name: 'today', path: '/' },
    { name: 'blocks', path: '/blocks' },
    { name: 'block', path: `/blocks/${things.block.id}` },
    { name: 'draw a block', path: '/blocks/new?by=draw' },
    { name: 'type a block', path: '/blocks/new?by=points' },
    { name: 'reshape a block', path: `/blocks/${things.block.id}/shape` },
    { name: 'split a block', path: `/blocks/${things.block.id}/split` },
    { name: 'merge blocks', path: `/blocks/merge?with=${things.block.id}` },
    { name: 'import blocks', path: '/blocks/import' },
    { name: 'ground', path: '/blocks/ground' },
    { name: 'a new hedge', path: '/blocks/ground/new?what=ground' },
    { name: 'a site', path: `/blocks/ground/${await findSite(manager)}?what=site` },
    { name: 'register', path: '/register' },
    { name: 'record', path: `/register/${record.id}` },
    { name: 'new record', path: '/register/new' },
    { name: 'inputs', path: '/inputs' },
    { name: 'season sheet', path: '/rounds' },
    { name: 'new season plan', path: '/rounds/plans/new' },
    { name: 'farm', path: '/farm' },
    { name: 'people of the farm', path: '/farm/people' },
    { name: 'sprayers', path: '/farm/sprayers' },
    { name: 'sprayer', path: `/farm/sprayers/${things.sprayer.id}` },
    { name: 'a new farm', path: '/farms/new' },
    { name: 'first hour', path: '/start' },
    { name: 'one’s own page', path: '/me' },
    { name: 'second factor', path: '/second-factor' },
    { name: 'nothing there', path: '/nothing-there' },
  ]
  return [
    ...open.map((screen) => ({ ...screen, who: null })),
    ...ofManager.map((screen) => ({ ...screen, who: 'manager' as const })),
    { name: 'grants', who: 'owner', path: '/farm/grants' },
    { name: 'journal', who: 'manager', path: '/farm/journal' },
    { name: 'mail of the farm', who: 'owner', path: '/farm/mail' },
    { name: 'people, to the owner', who: 'owner', path: '/farm/people' },
    { name: 'a person', who: 'owner', path: `/farm/people/${record.signedBy?.id ?? ''}` },
    { name: 'my farms', who: 'certifier', path: '/farms' },
  ]
}

/** A site that the demo farm keeps clear of. */
async function findSite(manager: FarmApi): Promise<string> {
  const { items } = await manager.get('/sites?limit=1', pageOf(siteSchema))
  return items[0]?.id ?? ''
}

/** Opens a screen and waits until all it reads has come. */
export async function openScreen(page: Page, path: string): Promise<void> {
  await page.goto(path)
  await settled(page)
}

/** Goes on to a screen within the page that is open, as a link does, and waits until all it reads has come. */
export async function goToScreen(page: Page, path: string): Promise<void> {
  await page.evaluate((to) => {
    history.pushState(null, '', to)
    dispatchEvent(new PopStateEvent('popstate', { state: null }))
  }, path)
  await settled(page)
}

/** Walks screens in their order, and looks at each: within one page as long as the same person looks. */
export async function walkScreens(page: Page, screens: readonly Screen[], look: (screen: Screen) => Promise<void>): Promise<void> {
  let walker: Who | null | undefined
  for (const screen of screens) {
    const isSame = screen.who === walker
    if (!isSame && screen.who !== null) await signInTo(page.context().request, screen.who)
    await (isSame ? goToScreen : openScreen)(page, screen.path)
    walker = screen.who
    await look(screen)
  }
}
