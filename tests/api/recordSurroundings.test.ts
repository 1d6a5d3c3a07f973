import { afterAll, beforeAll, expect, it } from 'vitest'
import { buildGround, buildRecord, buildSite } from '../../server/demo/buildThings.ts'
import { changeSite, createSite } from '../../server/services/ground/sites.ts'
import { createGround } from '../../server/services/ground/groundFeatures.ts'
import { collectRecordReport } from '../../server/services/records/collectRecordReport.ts'
import { openHouse, PASSWORD, type TestHouse } from '../support/openHouse.ts'
import { seedThings } from '../support/seedThings.ts'

let house: TestHouse

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())

it('are the ground and the sites near a record’s blocks that were there on the day of its work', async () => {
  house.setNow('2026-06-16T14:00:00Z')
  const farm = await house.makeFarm()
  const things = await seedThings(house, farm)
  const actor = await farm.actor('owner')
  /** Beside the block, which lies at 123.31° W, 44.61° N. */
  const near = { type: 'Point' as const, coordinates: [-123.3105, 44.6105] }
  const site = async (name: string, geometry: { type: 'Point'; coordinates: number[] }, endedOn: string | null = null): Promise<void> => {
    const { site: made } = await createSite(house.services, actor, buildSite({ name, geometry, keepClearM: '30' }))
    if (endedOn !== null) await changeSite(house.services, actor, made.id, { revision: 1, endedOn })
  }
  await site('Well', near)
  await site('Well filled in before', near, '2026-06-15')
  await site('Well filled in since', near, '2026-06-17')
  await site('Well of another farm', { type: 'Point', coordinates: [-123.29, 44.61] })
  await createGround(house.services, actor, buildGround({ name: 'Lane', kind: 'track', widthM: '3.5', geometry: { type: 'LineString', coordinates: [[-123.3105, 44.6], [-123.3105, 44.62]] } }))
  const record = buildRecord({ ...things, startedAt: '2026-06-16T12:00:00Z', endedAt: '2026-06-16T12:40:00Z' })
  const owner = await house.as(farm.accounts.owner)
  await owner.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
  await owner.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD }).expect(200)
  const { ground, sites } = await collectRecordReport(house.services, actor, record.id, { language: 'en' })
  expect(ground).toMatchObject([{ name: 'Lane', kind: 'track', widthM: 3.5 }])
  expect(sites.map(({ name }) => name)).toEqual(['Well', 'Well filled in since'])
})
