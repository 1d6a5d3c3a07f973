import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../server/app.ts'
import { buildBlock, buildLot, buildMaterial, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const address = (rest: string) => `/api/farms/${farm.id}${rest}`
const codes = (body: { errors: { path: string; code: string }[] }) => body.errors.map(({ path, code }) => `${path} ${code}`)

describe('a forged cursor', () => {
  const id = uuidV7()
  const cursors = [
    ['yesterday', id], ['', id], ['2026-06-16T13:00:00', id], ['2026-06-16T13:00:00+23:59', id], ['0000-01-01T00:00:00.000Z', id], ['2026-02-30T13:00:00.000Z', id],
    ['infinity', id], ['a\u0000b', id], ['a\ud800', id], ['x'.repeat(201), id], ['a', 'no id'], ['a'], [1, id], null, {},
  ].map((value) => Buffer.from(JSON.stringify(value)).toString('base64url'))

  it.each([...cursors, '%00', 'WyJ', '~~~'])('is refused by the register: %s', async (cursor) => {
    for (const query of [`cursor=${cursor}`, `cursor=${cursor}&block=${things.blockId}`]) {
      const response = await manager.get(address(`/records?${query}`))
      expect([response.status, ...codes(response.body)]).toEqual([422, 'cursor cursor.invalid'])
    }
  })

  it.each(['a\u0000b', 'a\ud800', 'x'.repeat(201), 1, null])('is refused by every other list: %j', async (key) => {
    const cursor = Buffer.from(JSON.stringify([key, id])).toString('base64url')
    for (const list of ['blocks', 'materials', 'lots', 'sprayers', 'people']) {
      const response = await manager.get(address(`/${list}?cursor=${cursor}`))
      expect([response.status, ...codes(response.body)]).toEqual([422, 'cursor cursor.invalid'])
    }
  })

  it('is not what the register itself gives', async () => {
    const times = [{ startedAt: '2026-06-14T10:00:00.5Z', endedAt: '2026-06-14T10:10:00Z' }, { startedAt: '2026-06-15T10:00:00Z', endedAt: '2026-06-15T10:10:00Z' }]
    for (const time of times) {
      await manager.post(address('/records')).send(buildRecord({ ...things, ...time })).expect(201)
    }
    const first = await manager.get(address('/records?limit=1')).expect(200)
    const second = await manager.get(address(`/records?limit=1&cursor=${first.body.next}`)).expect(200)
    expect(second.body.items[0].startedAt).toBe('2026-06-14T10:00:00.5Z')
  })
})

describe('days and times', () => {
  it.each([
    { receivedOn: '2026-06-17', errors: ['receivedOn time.future'] }, { receivedOn: '1969-12-31', errors: ['receivedOn date.years'] },
    { receivedOn: '2200-01-01', errors: ['receivedOn date.years'] }, { receivedOn: '2026-06-31', errors: ['receivedOn date.invalid'] },
  ])('a lot of $receivedOn is refused', async ({ receivedOn, errors }) => {
    const lot = { ...buildLot({ materialId: things.materialId, code: receivedOn }), receivedOn }
    const response = await manager.post(address('/lots')).send(lot)
    expect([response.status, ...codes(response.body)]).toEqual([422, ...errors])
  })

  it('takes the day it is on the farm, whatever Greenwich says', async () => {
    const east = await house.makeFarm({ zone: 'Pacific/Kiritimati' })
    const seeded = await seedThings(house, east)
    const agent = await house.as(east.accounts.manager)
    const lot = buildLot({ materialId: seeded.materialId, code: 'K-2', receivedOn: '2026-06-17' })
    expect((await agent.post(`/api/farms/${east.id}/lots`).send(lot)).status).toBe(201)
  })

  it('takes nine decimals of a second and not thirteen', async () => {
    const content = buildRecord({ ...things, startedAt: '2026-06-16T13:00:00.123456789Z' })
    await manager.post(address('/records')).send(content).expect(201)
    await manager.post(address(`/records/${content.id}/sign`)).send({ password: PASSWORD }).expect(200)
    const versions = await manager.get(address(`/records/${content.id}/versions`)).expect(200)
    expect(versions.body.items).toHaveLength(1)
    const { id: _id, ...finer } = content
    const response = await manager.post(address('/records')).send({ ...finer, id: uuidV7(), lines: [{ blockId: things.blockId, startedAt: '2026-06-16T13:00:00.1234567890123Z' }] })
    expect([response.status, ...codes(response.body)]).toEqual([422, 'lines.0.startedAt time.invalid'])
  })

  it.each(['EST5EDT', 'US/Pacific-New', 'Mars/Phobos', 'SystemV/PST8'])('a farm in %s is refused', async (zone) => {
    const response = await manager.post('/api/farms').send({ id: uuidV7(), name: 'Elsewhere', zone, seasonStart: '03-01' })
    expect([response.status, ...codes(response.body)]).toEqual([422, 'zone farm.zone'])
  })
})

describe('JSON that a parser would pass over', () => {
  const send = (text: string | Buffer, type = 'application/json') => manager.post(address('/materials')).set('Content-Type', type).send(text as string)
  const material = (more: string) => JSON.stringify(buildMaterial({ name: 'Twice' })).replace('{', `{${more},`)

  it.each([
    { what: 'a key twice', text: material('"name":"Once"'), code: 'json_duplicate_key' },
    { what: 'a key twice, once with an escape', text: material('"n\\u0061me":"Once"'), code: 'json_duplicate_key' },
    { what: 'sixty-five levels', text: `${'['.repeat(65)}${']'.repeat(65)}`, code: 'json_too_deep' },
    { what: 'half a million levels', text: `${'['.repeat(400_000)}${']'.repeat(400_000)}`, code: 'json_too_deep' },
    { what: 'no end', text: '{"a":', code: 'unreadable' },
  ])('$what', async ({ text, code }) => {
    const response = await send(text)
    expect(response.status).toBe(400)
    expect(response.body).toMatchObject({ code, status: 400 })
    expect(response.body.title).toMatch(/^[A-Z].*\.$/)
  })

  it('bytes that are no UTF-8, and another alphabet', async () => {
    const latin = Buffer.from(JSON.stringify(buildMaterial({ name: 'Süd' })), 'latin1')
    const agent = await house.as(farm.accounts.owner)
    const post = (type: string, body: Buffer) => agent.post(address('/materials')).set('Content-Type', type).serialize((value: unknown) => value as string).send(body)
    expect((await post('application/json', latin)).body.code).toBe('unreadable')
    expect((await post('application/json; charset=utf-16', Buffer.from('{}', 'utf16le'))).body.code).toBe('unreadable')
  })
})

describe('ids', () => {
  it('are the same in capitals, in the path and in the body', async () => {
    const block = buildBlock({ code: 'CAP', geometry: squareAt(3) })
    const response = await manager.post(address('/blocks').toUpperCase().replace('/API/FARMS', '/api/farms').replace('/BLOCKS', '/blocks')).send({ ...block, id: block.id.toUpperCase() })
    expect([response.status, response.body.id]).toEqual([201, block.id])
    await manager.post(address('/blocks')).send(block).expect(200)
    await manager.get(address(`/blocks/${block.id.toUpperCase()}`)).expect(200)
  })
})

describe('boundaries', () => {
  it.each([
    { what: 'exchanged axes', geometry: { type: 'Polygon', coordinates: [[[44, -123], [44.001, -123], [44.001, -123.001], [44, -123]]] }, code: 'geometry.maybe_swapped' },
    { what: 'a collection', geometry: { type: 'GeometryCollection', geometries: [] }, code: 'geometry.type' },
    { what: 'no coordinates', geometry: { type: 'Polygon' }, code: 'geometry.coordinates' },
    { what: 'coordinates that are none', geometry: { type: 'Polygon', coordinates: 'here' }, code: 'geometry.coordinates' },
  ])('$what', async ({ geometry, code }) => {
    const response = await manager.post(address('/blocks')).send({ ...buildBlock({ code: 'G' }), geometry })
    expect(response.status).toBe(422)
    expect(response.body.errors).toMatchObject([{ code }])
    expect(response.body.detail).not.toContain('problems.')
  })
})

describe('what is sent', () => {
  it.each([
    { path: '/records', body: () => ({ ...buildRecord(things), weather: { air: { value: '61', unit: 'degC', kind: 'felt' } } }), error: 'weather.air.value number.range' },
    { path: '/records', body: () => ({ ...buildRecord(things), notes: `a${'\n'.repeat(300)}b` }), error: 'notes text.too_many_lines' },
    { path: '/records', body: () => ({ ...buildRecord(things), water: { sizedFrom: 'water', value: '007', unit: 'L' } }), error: 'water.value number.format' },
    { path: '/materials', body: () => ({ ...buildMaterial({ name: 'L' }), label: { minStrengthPct: '3', maxStrengthPct: '2' } }), error: 'label.maxStrengthPct label.most_below_least' },
    { path: '/materials', body: () => ({ ...buildMaterial({ name: 'L' }), label: { maxRate: { value: '2', unit: 'kg/ha' } } }), error: 'label.maxRate.unit unit.needs_volume' },
    { path: '/materials', body: () => ({ ...buildMaterial({ name: 'L' }), name: 'A\u0085' }), error: 'name text.control' },
  ])('$error', async ({ path, body, error }) => {
    const response = await manager.post(address(path)).send(body())
    expect([response.status, ...codes(response.body)]).toEqual([422, error])
    expect(response.body.detail).not.toContain('problems.')
  })

  it('in an address is read strictly, and repeated in short', async () => {
    const long = await manager.get(address(`?${'q'.repeat(500)}=1`)).expect(422)
    expect(long.body.errors).toMatchObject([{ path: 'q'.repeat(80), code: 'unknown_field' }])
    for (const limit of ['1e2', '0x10', '5.0', '%205', '']) await manager.get(address(`/blocks?limit=${limit}`)).expect(422)
    for (const tile of ['1e0/0/0', '0/0x0/0', '0/0/-0', '1/0/9', '23/0/0', '0/99999999/0']) await manager.get(`/api/tiles/${tile}`).expect(404)
  })
})

describe('outside the API', () => {
  let folder: string
  let opened: ReturnType<typeof createApp>
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'client-'))
    writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Register</title>')
    opened = createApp(house.services, folder)
  })
  afterAll(() => {
    opened.close()
    rmSync(folder, { recursive: true })
  })

  it('every place is the one page, and an unknown file is none', async () => {
    for (const place of ['/', '/register', '/farms/x/blocks']) expect((await supertest(opened.app).get(place).expect(200)).text).toContain('Register')
    for (const file of ['/nope.js', '/favicon.ico', '/assets/nope.css', '/a/b.map']) {
      const response = await supertest(opened.app).get(file).expect(404).expect('Content-Type', /problem\+json/)
      expect(response.body.code).toBe('not_found')
    }
  })

  it('nothing is written', async () => {
    for (const app of [opened.app, house.app]) {
      const response = await supertest(app).post('/register').send({}).expect(405).expect('Content-Type', /problem\+json/)
      expect([response.body.code, response.get('Allow')]).toEqual(['wrong_method', 'GET, HEAD'])
    }
    await supertest(house.app).get('/register').expect(404).expect('Content-Type', /problem\+json/)
  })
})
