import { seasonSheetSchema } from '../../shared/contract/job.ts'
import { seasonPlanSchema } from '../../shared/contract/seasonPlan.ts'
import { addDays } from '../../shared/time/calendar.ts'
import { openScreen } from './support/screens.ts'
import { expect, test } from './support/test.ts'
import { dayFromNow, makeThings } from './support/things.ts'
import { unique } from './support/unique.ts'
import { say } from './support/words.ts'

test('the sheet is walked by keys, each cell one sentence; a job is drawn to another day', async ({ page, signInAs, manager }) => {
  const things = await makeThings(manager)
  const { today } = await manager.get(`/season-sheet?from=${dayFromNow(-1)}&to=${dayFromNow(1)}`, seasonSheetSchema)
  const step = {
    id: crypto.randomUUID(), method: 'foliar', materialId: things.first.material.id, basis: { kind: 'ratio', parts: '20' }, blockIds: [things.block.id],
    everyDays: 14, firstOn: addDays(today, 3), lastOn: addDays(today, 50), earlyDays: 2, lateDays: 4,
  }
  await manager.post('/season-plans', { id: crypto.randomUUID(), name: unique('Drawn '), steps: [step] }, seasonPlanSchema)
  await signInAs('manager')
  await openScreen(page, '/rounds')
  const grid = page.getByRole('grid', { name: say('rounds.sheet.name') })
  const cell = grid.getByRole('gridcell')
  const at = (code: string): RegExp => new RegExp(`^${code}, `)
  await grid.focus()
  const rows = Number(await grid.getAttribute('aria-rowcount'))
  for (let row = 0; row < rows && !at(things.block.code).test((await cell.getAttribute('aria-label')) ?? ''); row += 1) await page.keyboard.press('ArrowDown')
  await expect(cell).toHaveAccessibleName(new RegExp(`^${things.block.code}, .*today`))
  for (let day = 0; day < 3; day += 1) await page.keyboard.press('ArrowRight')
  await expect(cell).toHaveAccessibleName(new RegExp(`${things.first.material.name}, ${say('frame.method.foliar')}, planned`))
  await page.keyboard.press('Enter')
  const panel = page.getByRole('complementary')
  await expect(panel.getByRole('button', { name: say('rounds.job.move') })).toBeVisible()

  const box = (await cell.boundingBox()) ?? { x: 0, y: 0, width: 0, height: 0 }
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x + 2 * box.width, y, { steps: 4 })
  await page.mouse.up()
  await expect(panel.getByText(/^Moved to /)).toBeVisible()
  await page.keyboard.press('Home')
  await expect(cell).toHaveAttribute('aria-colindex', '1')
})
