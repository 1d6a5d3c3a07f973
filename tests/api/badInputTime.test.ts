import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildLot, buildRecord } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'
import { expectRefused } from '../support/sendBad.ts'

/** Times that did not happen, or that a clock told wrong; rows of the catalogue of bad input, section time. It is 14:00 UTC on 16 June 2026. */
let house: TestHouse
let farm: TestFarm
let things: SeededThings
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm, { lot: { quantity: { value: '10000', unit: 'L' } } })
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const line = (startedAt: unknown, endedAt: unknown) => () => ({ ...buildRecord(things), lines: [{ blockId: things.blockId, startedAt, endedAt }] })
const lot = (receivedOn: unknown) => () => ({ ...buildLot({ materialId: things.materialId }), receivedOn })

describe('is refused, and nothing is stored', () => {
  it.each([
    { what: 'B-39 two hours ahead', body: line('2026-06-16T16:00:00Z', null), errors: ['lines.0.startedAt time.future'] },
    { what: 'B-39 eleven minutes ahead', body: line('2026-06-16T13:00:00Z', '2026-06-16T14:11:00Z'), errors: ['lines.0.endedAt time.future'] },
    { what: 'B-40 the end before the start', body: line('2026-06-16T13:00:00Z', '2026-06-16T12:00:00Z'), errors: ['lines.0.startedAt time.end_before_start', 'lines.0.endedAt time.end_before_start'] },
    { what: 'B-41 thirty hours on end', body: line('2026-06-15T06:00:00Z', '2026-06-16T12:00:00Z'), errors: ['lines.0.endedAt time.too_long'] },
    { what: 'B-42 30 February', body: line('2026-02-30T10:00:00Z', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-43 on purpose: a time that the clock skips cannot be sent, a bare clock time is none', body: line('2026-03-29T02:30:00', null), errors: ['lines.0.startedAt time.zone_needed'] },
    { what: 'B-44 on purpose: a time that the clock shows twice cannot be sent without its offset', body: line('2025-10-26T02:30:00', null), errors: ['lines.0.startedAt time.zone_needed'] },
    { what: 'B-45 a time without zone', body: line('2026-06-16T06:00:00', null), errors: ['lines.0.startedAt time.zone_needed'] },
    { what: 'B-50 infinity', body: line('infinity', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-50 tomorrow', body: line('tomorrow', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-50 epoch', body: line('epoch', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-50 the year 20266', body: line('20266-06-16T06:00:00Z', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-51 a leap second', body: line('2026-06-15T23:59:60Z', null), errors: ['lines.0.startedAt time.invalid'] },
    { what: 'B-50 a number', body: line(1_781_600_000, null), errors: ['lines.0.startedAt field.type'] },
  ])('$what', ({ what, body, errors }) => expectRefused(house, farm, manager, { what, path: '/records', body, errors }))

  it.each([
    { what: 'B-42 30 February', day: '2026-02-30', error: 'date.invalid' }, { what: 'B-50 infinity', day: 'infinity', error: 'date.invalid' },
    { what: 'B-50 today', day: 'today', error: 'date.invalid' }, { what: 'B-39 a day that has not come', day: '2026-06-17', error: 'time.future' },
    { what: 'B-45 an instant for a day', day: '2026-06-16T06:00:00Z', error: 'date.invalid' },
  ])('$what of a lot', ({ what, day, error }) => expectRefused(house, farm, manager, { what, path: '/lots', body: lot(day), errors: [`receivedOn ${error}`] }))

  it.each(['Mars/Phobos', 'EST5EDT', '+02:00', 'pacific/honolulu', ''])('B-46 a farm in the zone %j', async (zone) => {
    const { body } = await manager.post('/api/farms').send({ id: uuidV7(), name: 'Elsewhere', zone, seasonStart: '03-01' }).expect(422)
    expect(body.errors[0].path).toBe('zone')
  })

  it.each(['02-30', '13-01', '2-1', '02-29', ''])('B-42 a season that begins on %j', async (seasonStart) => {
    const { body } = await manager.post('/api/farms').send({ id: uuidV7(), name: 'Elsewhere', zone: 'Pacific/Honolulu', seasonStart }).expect(422)
    expect(body.errors).toMatchObject([{ path: 'seasonStart', code: 'date.invalid' }])
  })
})

describe('nearly now', () => {
  it('B-39 ten minutes ahead are a clock that runs fast', async () => {
    const { status } = await manager.post(`/api/farms/${farm.id}/records`).send(line('2026-06-16T13:00:00Z', '2026-06-16T14:10:00Z')())
    expect(status).toBe(201)
  })

  it('B-49, B-52 on purpose the season is that of the day on the farm, never asked for', async () => {
    const east = await house.makeFarm({ zone: 'Pacific/Tongatapu' })
    const seeded = await seedThings(house, east)
    const agent = await house.as(east.accounts.manager)
    // 28 February in Greenwich, 1 March on the farm, where the season begins.
    const record = buildRecord({ ...seeded, startedAt: '2026-02-28T12:00:00Z', endedAt: '2026-02-28T12:30:00Z' })
    await agent.post(`/api/farms/${east.id}/records`).send(record).expect(201)
    const { body } = await agent.post(`/api/farms/${east.id}/records/${record.id}/sign`).send({ password: PASSWORD, acknowledged: [{ code: 'record.late', reason: 'Found it.' }] }).expect(200)
    expect([body.season, body.number]).toEqual([2026, '2026-0001'])
  })

  it('B-55 eight months late asks for the reason', async () => {
    const record = buildRecord({ ...things, startedAt: '2025-10-16T13:00:00Z', endedAt: '2025-10-16T13:40:00Z' })
    await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    const asked = await manager.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD })
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ code: 'record.late', params: { days: 243 } }] })
    await manager.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD, acknowledged: [{ code: 'record.late', reason: 'Found it.' }] }).expect(200)
  })
})

describe('the clock of the device', () => {
  const send = async (deviceAt: string | null) => {
    const record = { ...buildRecord(things), deviceAt }
    const made = await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    const sign = (acknowledged: object[] = []) => manager.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD, acknowledged })
    return { made: made.body as Record<string, unknown>, sign }
  }

  it.each([
    { what: 'B-47 three days ahead', deviceAt: '2026-06-19T14:00:00Z', minutes: 3 * 24 * 60 },
    { what: 'right', deviceAt: '2026-06-16T14:00:20Z', minutes: 0 },
    { what: 'twenty minutes behind', deviceAt: '2026-06-16T13:40:00Z', minutes: -20 },
    { what: 'not told', deviceAt: null, minutes: null },
  ])('$what is told beside the server’s and bars nothing', async ({ deviceAt, minutes }) => {
    const { made, sign } = await send(deviceAt)
    expect([made.deviceAt, made.receivedAt, made.clockSkewMinutes]).toEqual([deviceAt?.replace('Z', '.000Z') ?? null, '2026-06-16T14:00:00.000Z', minutes])
    expect((await sign().expect(200)).body.clockSkewMinutes).toBe(minutes)
  })

  it('B-48 in 1970 is taken, and the days of the work have to be confirmed', async () => {
    const { made, sign } = await send('1970-01-02T00:00:00Z')
    expect(made.clockSkewMinutes).toBeLessThan(-20_000_000)
    const asked = await sign()
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ path: 'lines', code: 'time.device_clock' }] })
    const signed = await sign([{ code: 'time.device_clock', reason: 'It was this morning.' }])
    expect([signed.status, signed.body.acknowledged]).toEqual([200, [{ code: 'time.device_clock', reason: 'It was this morning.' }]])
  })
})
