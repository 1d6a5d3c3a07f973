import { signInTo, type Who } from './support/demoFarm.ts'
import { goToScreen, openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { watchPages } from './support/watchPage.ts'

const EVERYBODY = ['/blocks', '/blocks/BLOCK', '/blocks/ground', '/register', '/register/RECORD', '/inputs']
const OF_FARM = ['/', ...EVERYBODY, '/register/new', '/rounds', '/farm', '/farm/people', '/farm/sprayers', '/me']
/** What differs by role: the walk over every screen goes as the manager, and as the owner where only one comes. */
const PLACES: Partial<Record<Who, string[]>> = { owner: ['/', '/start', '/farm', '/farm/sprayers', '/farm/grants/GRANT'], applicator: OF_FARM, certifier: ['/farms', ...EVERYBODY] }

for (const [who, paths] of Object.entries(PLACES)) {
  test(`the ${who} walks every place without one refused request, error or violation`, async ({ page, context, manager }) => {
    const things = await makeThings(manager)
    const record = await makeSignedRecord(manager, things)
    await signInTo(context.request, who as Who)
    // Who has several farms walks the one that the block and the record are of.
    await context.addInitScript((farmId) => { localStorage.setItem('drenchleaf.farm', farmId) }, manager.farmId)
    const grants = who === 'owner' ? ((await (await context.request.get(`/api/farms/${manager.farmId}/grants`)).json()) as { items: { id: string }[] }).items : []
    const found = await watchPages(context, { strict: true })
    const titles = new Set<string>()
    await openScreen(page, '/signin')
    for (const path of paths) {
      await goToScreen(page, path.replace('GRANT', grants[0]?.id ?? '').replace('BLOCK', things.block.id).replace('RECORD', record.id))
      await expect(page, path).toHaveTitle(/ – Drenchleaf$/)
      titles.add(await page.title())
    }
    expect(found).toEqual([])
    expect(titles.size, 'every page has a name of its own').toBe(paths.length)
  })
}
