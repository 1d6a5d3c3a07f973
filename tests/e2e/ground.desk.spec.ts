import { pageOf } from '../../shared/contract/common.ts'
import { siteSchema } from '../../shared/contract/ground.ts'
import { readText } from '../support/readPdf.ts'
import { choose, field, segment } from './support/controls.ts'
import { expect, test } from './support/test.ts'
import { unique } from './support/unique.ts'
import { say, saying } from './support/words.ts'

/** In the demo farm, west of its brook, where no block lies. */
const WELL = { typed: '44.6060000, -123.3185000', at: [-123.3185, 44.606] }

test('writes a well down by a typed point, with its distance, changes and ends it', async ({ page, signInAs, manager }) => {
  await signInAs('manager')
  const name = unique('Well ')
  await page.goto('/blocks/ground/new?what=site')
  const main = page.getByRole('main', { name: say('ground.form.newSite') })
  await choose(main, say('ground.form.kind'), say('ground.siteKind.well'), { exact: true })
  await field(main, say('ground.form.name')).fill(name)
  await field(main, say('ground.form.distance')).fill('0')
  await segment(main, say('blocks.draw.byPoints'))
  await main.getByRole('button', { name: say('ground.form.save'), exact: true }).click()
  await expect(main.getByText(say('ground.form.needed.point'))).toBeVisible()
  await expect(main.getByText(say('problems.number.above_zero'))).toBeVisible()
  await field(main, say('blocks.points.label')).fill(WELL.typed)
  await field(main, say('ground.form.distance')).fill('25')
  await main.getByRole('button', { name: say('ground.form.save'), exact: true }).click()

  const list = page.getByRole('table', { name: say('ground.list.sitesCaption') })
  const row = list.getByRole('row', { name: name })
  await expect(row).toContainText('25')
  await page.reload()
  await expect(row).toContainText('25')
  await expect(page.getByRole('application').getByText(name, { exact: true })).toBeAttached()
  const { items } = await manager.get('/sites?limit=200', pageOf(siteSchema))
  expect(items.find((site) => site.name === name)).toMatchObject({ kind: 'well', keepClearM: '25', geometry: { type: 'Point', coordinates: WELL.at } })

  await row.getByRole('button', { name: say('ground.list.changeNamed', { name }) }).click()
  const form = page.getByRole('main', { name })
  await form.getByLabel(say('ground.form.endedOn')).fill('2026-01-02')
  await form.getByRole('button', { name: say('ground.form.save'), exact: true }).click()
  await expect(row).toContainText(saying('ground.list.gone'))
  await expect(page.getByRole('application').getByText(name, { exact: true })).toHaveCount(0)
})

test('opens the farm map on paper from the blocks', async ({ page, signInAs }) => {
  await signInAs('certifier')
  await page.goto('/blocks')
  const link = page.getByRole('link', { name: `${say('ground.farmMap')}, ${say('ground.paper.a3')}` })
  const answer = await page.request.get((await link.getAttribute('href')) ?? '')
  expect([answer.status(), answer.headers()['content-type']]).toEqual([200, 'application/pdf'])
  const text = readText(await answer.body())
  for (const words of ['Wennick Hollow', say('mapPrint.title'), 'Yard well, 30 m', say('mapPrint.foot')]) expect(text).toContain(words)
})
