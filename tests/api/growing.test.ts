import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent
let applicator: Agent
let things: SeededThings

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
  applicator = await house.as(farm.accounts.applicator)
  things = await seedThings(house, farm)
})
afterAll(() => house.close())

const at = (path: string) => `/api/farms/${farm.id}/${path}`

describe('plantings', () => {
  const planting = () => ({
    id: uuidV7(), blockId: things.blockId, crop: 'Apple', eppo: 'mabsd', variety: 'Marl Pippin', plantedOn: '2014-03-20', ediblePart: 'Fruit',
    soilContact: 'none', plants: 640, harvests: [{ from: '2026-09-08', to: '2026-09-30', note: 'First pick' }],
  })

  it('are written once, kept in several, changed over the revision that was seen, and counted on the block', async () => {
    const input = planting()
    const made = await owner.post(at('plantings')).send(input).expect(201)
    expect(made.body).toMatchObject({ ...input, eppo: 'MABSD', part: null, removedOn: null, revision: 1 })
    expect((await owner.post(at('plantings')).send(input).expect(200)).body).toEqual(made.body)
    await owner.post(at('plantings')).send({ ...planting(), part: squareAt(0, 0.0005), plants: 60 }).expect(201)
    expect((await owner.get(at(`blocks/${things.blockId}`))).body.counts.plants).toBe(700)
    const { id, blockId: _blockId, ...content } = input
    const pulled = await owner.patch(at(`plantings/${id}`)).send({ ...content, revision: 1, removedOn: '2026-02-01' }).expect(200)
    expect(pulled.body).toMatchObject({ removedOn: '2026-02-01', revision: 2 })
    expect((await owner.patch(at(`plantings/${id}`)).send({ ...content, revision: 1 })).status).toBe(409)
    expect((await owner.get(at(`blocks/${things.blockId}`))).body.counts.plants).toBe(60)
    expect((await owner.get(at(`plantings?blockId=${things.blockId}`))).body.items).toHaveLength(2)
    expect((await owner.get(at(`plantings?blockId=${uuidV7()}`))).body.items).toEqual([])
  })

  it.each([
    { name: 'a code that is none', change: { eppo: 'APPLE-1' }, path: 'eppo', code: 'planting.eppo' },
    { name: 'an end before its beginning', change: { removedOn: '2013-01-01' }, path: 'removedOn', code: 'date.to_before_from' },
    { name: 'a harvest that runs backwards', change: { harvests: [{ from: '2026-09-08', to: '2026-09-01' }] }, path: 'harvests.0.to', code: 'date.to_before_from' },
    { name: 'a part beyond the block', change: { part: squareAt(9) }, path: 'part', code: 'part.outside_block' },
    { name: 'no plants', change: { plants: 0 }, path: 'plants', code: 'field.too_small' },
    { name: 'a block of nowhere', change: { blockId: '00000000-0000-7000-8000-000000000000' }, path: 'blockId', code: 'block.unknown' },
  ])('refuse $name', async ({ change, path, code }) => {
    const refused = await owner.post(at('plantings')).send({ ...planting(), ...change })
    expect(refused.body).toMatchObject({ status: 422, errors: [{ path, code }] })
    expect(refused.body.detail).not.toMatch(/problems\.|\{/)
  })
})

describe('beds and rows', () => {
  const rows = () => ({ id: uuidV7(), blockId: things.blockId, kind: 'row', fromNumber: 1, toNumber: 18, count: 18, lengthM: '92.5', plants: 630 })
  it('carry numbers or a name, and are counted on the block', async () => {
    const input = rows()
    const made = await owner.post(at('beds')).send(input).expect(201)
    expect(made.body).toMatchObject({ ...input, name: null, widthM: null, endedOn: null, revision: 1 })
    await owner.post(at('beds')).send({ id: uuidV7(), blockId: things.blockId, kind: 'bed', name: 'Herbs', count: 3, widthM: '1.2' }).expect(201)
    expect((await owner.get(at(`blocks/${things.blockId}`))).body.counts).toMatchObject({ beds: 3, rows: 18, rowM: 1665 })
    const { id, blockId: _blockId, ...content } = input
    expect((await owner.patch(at(`beds/${id}`)).send({ ...content, revision: 1, endedOn: '2026-06-01' }).expect(200)).body).toMatchObject({ endedOn: '2026-06-01', revision: 2 })
    expect((await owner.patch(at(`beds/${id}`)).send({ ...content, revision: 1 })).status).toBe(409)
    expect((await owner.get(at(`blocks/${things.blockId}`))).body.counts).toMatchObject({ beds: 3, rows: null, rowM: null })
  })

  it.each([
    { name: 'neither numbers nor name', change: { fromNumber: null, toNumber: null }, path: 'name', code: 'bed.named' },
    { name: 'one number alone', change: { toNumber: null }, path: 'toNumber', code: 'field.required' },
    { name: 'numbers backwards', change: { fromNumber: 19 }, path: 'toNumber', code: 'bed.span' },
    { name: 'another count than the numbers come to', change: { count: 20 }, path: 'count', code: 'bed.count' },
    { name: 'a length of nothing', change: { lengthM: '0' }, path: 'lengthM', code: 'number.above_zero' },
  ])('refuse $name', async ({ change, path, code }) => {
    const refused = await owner.post(at('beds')).send({ ...rows(), ...change })
    expect(refused.body).toMatchObject({ status: 422, errors: [{ path, code }] })
    expect(refused.body.detail).not.toMatch(/problems\.|\{/)
  })
})

describe('farm events', () => {
  const event = (change: object = {}) => ({ id: uuidV7(), kind: 'mown', blockIds: [things.blockId], on: '2026-06-15', ...change })
  it('are written by anybody of the farm, once, newest day first', async () => {
    const input = event({ on: '2026-06-14' })
    const made = await applicator.post(at('farm-events')).send(input).expect(201)
    expect(made.body).toMatchObject({ kind: 'mown', blockIds: [things.blockId], on: '2026-06-14', note: null, withdrawn: null })
    expect((await applicator.post(at('farm-events')).send(input).expect(200)).body).toEqual(made.body)
    await owner.post(at('farm-events')).send(event({ kind: 'other', note: 'Deer fence mended' })).expect(201)
    const days = async (query = '') => (await owner.get(at(`farm-events${query}`)).expect(200)).body.items.map(({ on }: { on: string }) => on)
    expect(await days()).toEqual(['2026-06-15', '2026-06-14'])
    expect(await days('?from=2026-06-15')).toEqual(['2026-06-15'])
    expect(await days(`?blockId=${things.blockId}&to=2026-06-14`)).toEqual(['2026-06-14'])
    const first = (await owner.get(at('farm-events?limit=1'))).body
    expect((await owner.get(at(`farm-events?limit=1&cursor=${first.next}`))).body).toMatchObject({ items: [{ on: '2026-06-14' }], next: null })
  })

  it.each([
    { name: 'a day to come', change: { on: '2026-06-17' }, path: 'on', code: 'time.future' },
    { name: 'something else without a word', change: { kind: 'other' }, path: 'note', code: 'text.required' },
    { name: 'no block', change: { blockIds: [] }, path: 'blockIds', code: 'field.too_small' },
    { name: 'a block of nowhere', change: { blockIds: ['00000000-0000-7000-8000-000000000000'] }, path: 'blockIds', code: 'block.unknown' },
  ])('refuse $name', async ({ change, path, code }) => {
    expect((await applicator.post(at('farm-events')).send(event(change))).body).toMatchObject({ status: 422, errors: [{ path, code }] })
  })

  it('are taken back with a reason, by whoever wrote them or a leader, and stand otherwise', async () => {
    const { body: mine } = await applicator.post(at('farm-events')).send(event({ on: '2026-06-10' })).expect(201)
    const { body: theirs } = await owner.post(at('farm-events')).send(event({ on: '2026-06-10' })).expect(201)
    expect((await applicator.post(at(`farm-events/${theirs.id}/withdraw`)).send({ reason: 'No' })).body).toMatchObject({ status: 403, code: 'event.not_yours' })
    const taken = await applicator.post(at(`farm-events/${mine.id}/withdraw`)).send({ reason: 'The wrong block' }).expect(200)
    expect(taken.body).toMatchObject({ id: mine.id, withdrawn: { reason: 'The wrong block', by: { name: expect.stringMatching(/^applicator/) } } })
    expect((await applicator.post(at(`farm-events/${mine.id}/withdraw`)).send({ reason: 'The wrong block' }).expect(200)).body).toEqual(taken.body)
    expect((await owner.post(at(`farm-events/${mine.id}/withdraw`)).send({ reason: 'Again' })).body).toMatchObject({ status: 409, code: 'event.withdrawn' })
    const change = (sql: string) => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) => manager.query(sql, [mine.id]))
    await expect(change("UPDATE farm_events SET note = 'x' WHERE id = $1")).rejects.toMatchObject({ code: '42501' })
    await expect(change('UPDATE farm_events SET withdrawn_reason = NULL, withdrawn_at = NULL, withdrawn_by_id = NULL WHERE id = $1')).rejects.toMatchObject({ code: '42501' })
  })
})

describe('a certifier', () => {
  it('sees what belongs to blocks of granted records, events of granted seasons, and nothing else', async () => {
    const seen = uuidV7()
    const unseen = (await owner.post(at('blocks')).send(buildBlock({ code: 'NEVER', geometry: squareAt(20) })).expect(201)).body.id as string
    const input = buildRecord(things)
    await owner.post(at('records')).send(input).expect(201)
    await owner.post(at(`records/${input.id}/sign`)).send({ password: PASSWORD }).expect(200)
    await owner.post(at('plantings')).send({ id: uuidV7(), blockId: unseen, crop: 'Secret' }).expect(201)
    await owner.post(at('beds')).send({ id: uuidV7(), blockId: unseen, kind: 'bed', name: 'Secret', count: 1 }).expect(201)
    await owner.post(at('farm-events')).send({ id: seen, kind: 'watered', blockIds: [unseen, things.blockId], on: '2026-06-16' }).expect(201)
    await owner.post(at('farm-events')).send({ id: uuidV7(), kind: 'watered', blockIds: [unseen], on: '2026-06-16' }).expect(201)
    const before = uuidV7()
    await owner.post(at('farm-events')).send({ id: before, kind: 'watered', blockIds: [things.blockId], on: '2026-02-20' }).expect(201)
    const certifier = await house.as(farm.accounts.certifier)
    const items = async (path: string) => (await certifier.get(at(path)).expect(200)).body.items
    expect((await items('plantings')).every(({ blockId }: { blockId: string }) => blockId === things.blockId)).toBe(true)
    expect((await items('beds')).every(({ blockId }: { blockId: string }) => blockId === things.blockId)).toBe(true)
    const events = await items('farm-events?limit=200')
    expect(events.find(({ id }: { id: string }) => id === seen)).toMatchObject({ blockIds: [things.blockId] })
    expect(events.flatMap(({ blockIds }: { blockIds: string[] }) => blockIds)).not.toContain(unseen)
    expect(events.map(({ id }: { id: string }) => id)).not.toContain(before)
    expect(await items(`blocks/${things.blockId}/boundaries`)).toMatchObject([{ version: 1, records: [{ id: input.id }] }])
    expect((await certifier.get(at(`blocks/${unseen}/boundaries`))).status).toBe(404)
  })
})
