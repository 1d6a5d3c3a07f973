import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest'
import { buildBlock, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let owner: Agent

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
/** Six days to wait for picking, a day and a half for going in; the farm's clock runs five hours behind UTC. */
beforeEach(async () => {
  house.setNow('2026-06-16T14:00:00Z')
  farm = await house.makeFarm()
  things = await seedThings(house, farm, {
    material: { label: { maxRate: null, minStrengthPct: null, maxStrengthPct: null, reEntryHours: '36', preHarvestDays: 6, source: 'label, part 2' } },
  })
  owner = await house.as(farm.accounts.owner)
})

const at = (path: string) => `/api/farms/${farm.id}/${path}`
const holds = async (agent: Agent = owner): Promise<object[]> => (await agent.get(at('holds')).expect(200)).body.items as object[]
const recordOn = (day: string) => buildRecord({ ...things, startedAt: `${day}T13:00:00Z`, endedAt: `${day}T13:40:00Z` })
async function signed(day: string): Promise<string> {
  const record = recordOn(day)
  await owner.post(at('records')).send(record).expect(201)
  await owner.post(at(`records/${record.id}/sign`)).send({ password: PASSWORD }).expect(200)
  return record.id
}

const boxOf = (ring: [number, number][]): [number, number, number, number] => {
  const [xs, ys] = [ring.map(([x]) => x), ring.map(([, y]) => y)]
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)]
}

it('are what the labels of signed records set, while they last', async () => {
  const draft = recordOn('2026-06-14')
  await owner.post(at('records')).send(draft).expect(201)
  expect(await holds()).toEqual([])
  const id = await signed('2026-06-14')
  const held = {
    blockId: things.blockId, recordId: id, number: '2026-0001', on: '2026-06-14', from: '2026-06-14T13:40:00Z', reEntryUntil: '2026-06-16T01:40:00Z', pickFrom: '2026-06-20', heldTo: '2026-06-19',
  }
  expect(await holds()).toEqual([held])
  house.setNow('2026-06-19T23:00:00Z')
  expect(await holds()).toEqual([held])
  house.setNow('2026-06-20T14:00:00Z')
  expect(await holds()).toEqual([])
})

it('follow an amendment, and end with a withdrawal', async () => {
  const id = await signed('2026-06-14')
  const [line] = recordOn('2026-06-12').lines ?? []
  await owner.post(at(`records/${id}/amend`)).send({ reason: 'It was two days earlier.', lines: [line], password: PASSWORD }).expect(200)
  expect(await holds()).toMatchObject([{ on: '2026-06-12', pickFrom: '2026-06-18' }])
  await owner.post(at(`records/${id}/withdraw`)).send({ reason: 'Written down twice.', password: PASSWORD }).expect(200)
  expect(await holds()).toEqual([])
})

it('are read of one block over a span of days, and of no block that is not there', async () => {
  await signed('2026-06-02')
  await signed('2026-06-14')
  const other = buildBlock({ code: 'B2', geometry: squareAt(1) })
  await owner.post(at('blocks')).send(other).expect(201)
  const of = async (blockId: string, days: string): Promise<object[]> => (await owner.get(at(`blocks/${blockId}/holds?${days}`)).expect(200)).body.items as object[]
  expect(await of(things.blockId, 'from=2026-06-07&to=2026-06-13')).toMatchObject([{ on: '2026-06-02', heldTo: '2026-06-07' }])
  expect(await of(things.blockId, 'from=2026-03-01&to=2027-02-28')).toHaveLength(2)
  expect(await of(other.id, 'from=2026-03-01&to=2027-02-28')).toEqual([])
  await owner.get(at('blocks/0198a4f2-0000-7000-8000-000000000009/holds?from=2026-06-01&to=2026-06-30')).expect(404)
  await owner.get(at(`blocks/${things.blockId}/holds?from=2026-06-30&to=2026-06-01`)).expect(422)
})

it('lie on what came of a block that was split, and of parts that were merged', async () => {
  await signed('2026-06-14')
  const { body: block } = await owner.get(at(`blocks/${things.blockId}`)).expect(200)
  const [west, south, east, north] = boxOf(block.geometry.coordinates[0])
  const middle = (west + east) / 2
  const part = (code: string, [from, to]: [number, number]) => ({ id: uuidV7(), code, name: code, geometry: { type: 'Polygon', coordinates: [[[from, south], [to, south], [to, north], [from, north], [from, south]]] } })
  const parts = [part('B1a', [west, middle]), part('B1b', [middle, east])]
  await owner.post(at(`blocks/${things.blockId}/split`)).send({ revision: block.revision, parts }).expect(200)
  const heldNow = async () => (await holds() as { blockId: string }[]).map(({ blockId }) => blockId)
  expect(await heldNow()).toEqual(expect.arrayContaining(parts.map(({ id }) => id)))
  const { body: strip } = await owner.get(at(`blocks/${parts[0]?.id ?? ''}/holds?from=2026-06-01&to=2026-06-30`)).expect(200)
  expect(strip.items).toMatchObject([{ blockId: parts[0]?.id, on: '2026-06-14', pickFrom: '2026-06-20' }])

  const merged = { id: uuidV7(), code: 'B9', name: 'Again' }
  await owner.post(at('blocks/merge')).send({ blocks: parts.map(({ id }) => ({ id, revision: 1 })), block: merged }).expect(200)
  expect(await heldNow()).toContain(merged.id)
})

it('are seen by a certifier of that season alone', async () => {
  await signed('2026-06-14')
  const { farmId, role } = await farm.actor('certifier')
  const seen = (seasons: number[]): Promise<object[]> => house.services.database.inFarm({ farmId, role, seasons }, (tx) => tx.query('SELECT 1 FROM record_lines WHERE held_to IS NOT NULL'))
  expect(await seen([2026])).toHaveLength(1)
  expect(await seen([2025])).toEqual([])
  expect(await holds(await house.as(farm.accounts.certifier))).toHaveLength(1)
})
