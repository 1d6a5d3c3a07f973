import { signInTo, type Who } from './support/demoFarm.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { makeSignedRecord, makeThings } from './support/things.ts'
import { watchPages } from './support/watchPage.ts'

const OPEN = ['/signin', '/check', '/welcome', '/reset']
const EVERYBODY = ['/blocks', '/blocks/BLOCK', '/blocks/ground', '/register', '/register/RECORD', '/inputs']
const OF_FARM = ['/', ...EVERYBODY, '/register/new', '/rounds', '/farm', '/farm/people', '/farm/sprayers', '/me']
const OF_LEADERS = [...OF_FARM, '/start', '/farm/sprayers/SPRAYER', '/blocks/new?by=draw', '/blocks/new?by=points', '/blocks/BLOCK/shape', '/blocks/BLOCK/split', '/blocks/merge', '/blocks/ground/new?what=site', '/blocks/import', '/rounds/plans/new', '/farm/journal', '/farms/new']
/** An owner opens all that a manager does, and this: what differs by role. */
const OF_OWNER = ['/', '/start', '/farm', '/farm/people', '/farm/sprayers', '/farm/journal', '/farm/mail', '/farm/grants', '/farm/grants/GRANT']
const PLACES: Record<Exclude<Who, 'neighbour'>, string[]> = { owner: OF_OWNER, manager: OF_LEADERS, applicator: OF_FARM, certifier: ['/farms', ...EVERYBODY] }

test('who is not signed in opens the cover pages without one refused request or error', async ({ page, context }) => {
  const found = await watchPages(context, { strict: true })
  for (const path of OPEN) await openScreen(page, path)
  expect(found).toEqual([])
})

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
    for (const path of paths) {
      await openScreen(page, path.replace('GRANT', grants[0]?.id ?? '').replace('SPRAYER', things.sprayer.id).replace('BLOCK', things.block.id).replace('RECORD', record.id))
      await expect(page, path).toHaveTitle(/ – Drenchleaf$/)
      titles.add(await page.title())
    }
    expect(found).toEqual([])
    expect(titles.size, 'every page has a name of its own, drawing and typing a block share one').toBe(paths.length - (paths.includes('/farms/new') ? 1 : 0))
  })
}
