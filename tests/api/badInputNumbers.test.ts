import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildLot, buildMaterial, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'
import { expectRefused, faultsOf } from '../support/sendBad.ts'

/** Numbers that a parser would quietly make something of; rows of the catalogue of bad input, section numbers and units. */
let house: TestHouse
let farm: TestFarm
let things: SeededThings
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm, { material: { label: { maxRate: { value: '2.5', unit: 'L/ha' }, minStrengthPct: null, maxStrengthPct: null, reEntryHours: null, preHarvestDays: null, source: null } } })
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

/** Sends text that no value of ours could be written as. */
const sendRaw = (path: string, text: string) => manager.post(`/api/farms/${farm.id}${path}`).set('Content-Type', 'application/json').send(text)
const water = (value: unknown) => () => ({ ...buildRecord(things), water: { sizedFrom: 'water', value, unit: 'L' } })
const weather = (facts: object) => () => ({ ...buildRecord(things), weather: facts })
const per = (basis: object) => () => ({ ...buildRecord(things), components: [{ materialId: things.materialId, lotId: things.lotId, basis }] })

describe('no plain decimal above zero', () => {
  it.each([
    ['B-21', 'NaN'], ['B-22', 'Infinity'], ['B-22', '1e400'], ['B-23', '-5'], ['B-25', '1,5'], ['B-26', '12abc'], ['B-27', ''], ['B-27', ' '],
    ['B-28', '0x10'], ['B-28', '1e3'], ['B-28', '٣'], ['B-28', '+5'], ['B-29', '1.00005'], ['B-30', '9007199254740993'], ['B-37', '-0'],
  ])('%s %j is refused everywhere', async (what, value) => {
    const rows = [
      { what, path: '/records', body: water(value), errors: ['water.value number.format'] },
      { what, path: '/records', body: per({ kind: 'ratio', parts: value }), errors: ['components.0.basis.parts number.format'] },
      { what, path: '/lots', body: () => ({ ...buildLot({ materialId: things.materialId }), quantity: { value, unit: 'L' } }), errors: ['quantity.value number.format'] },
      { what, path: '/sprayers', body: () => ({ id: uuidV7(), code: 'S', name: 'Sprayer', tankL: value }), errors: ['tankL number.format'] },
    ]
    for (const row of rows) await expectRefused(house, farm, manager, row)
  })

  it.each([
    { what: 'B-24 zero', body: water('0'), errors: ['water.value number.above_zero'] },
    { what: 'B-24 zero with decimals', body: water('0.000'), errors: ['water.value number.above_zero'] },
    { what: 'B-27 null', body: water(null), errors: ['water.value field.type'] },
    { what: 'B-27 true', body: water(true), errors: ['water.value field.type'] },
    { what: 'B-27 a list', body: water([5]), errors: ['water.value field.type'] },
    { what: 'B-30 a number where text is asked for', body: water(12.5), errors: ['water.value field.type'] },
  ])('$what', ({ what, body, errors }) => expectRefused(house, farm, manager, { what, path: '/records', body, errors }))

  it.each([['B-22', '1e400'], ['B-30', '9007199254740993']])('%s %s as a bare number', async (_row, number) => {
    const text = JSON.stringify(water('HERE')()).replace('"HERE"', number)
    expect(faultsOf((await sendRaw('/records', text).expect(422)).body)).toEqual(['water.value field.type'])
    const counts = JSON.stringify(buildMaterial({ name: 'N', label: { preHarvestDays: 1 } })).replace('"preHarvestDays":1', `"preHarvestDays":${number}`)
    expect((await sendRaw('/materials', counts).expect(422)).body.errors[0].path).toBe('label.preHarvestDays')
  })

  it('B-21 on purpose also at the last wall: the columns take no NaN and no Infinity', async () => {
    for (const value of ['NaN', 'Infinity']) {
      for (const change of [`lots SET quantity = '${value}'`, `lots SET left_quantity = '${value}'`, `blocks SET area_m2 = '${value}'`]) {
        const write = house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) => tx.query(`UPDATE ${change}`))
        await expect(write).rejects.toMatchObject({ code: '23514' })
      }
    }
  })
})

describe('units and figures that do not fit', () => {
  it.each([
    { what: 'B-32 kilograms of a liquid', path: '/records', body: per({ kind: 'perArea', value: '2', unit: 'kg/ha' }), errors: ['components.0.basis.unit unit.needs_volume'] },
    { what: 'B-32 no unit of ours', path: '/records', body: per({ kind: 'perArea', value: '2', unit: 'L/furlong' }), errors: ['components.0.basis.unit unit.not_allowed'] },
    { what: 'B-32 a lot of a liquid by weight', path: '/lots', body: () => ({ ...buildLot({ materialId: things.materialId }), quantity: { value: '2', unit: 'kg' } }), errors: ['quantity.unit unit.needs_volume'] },
    { what: 'B-36 wind of −3 m/s', path: '/records', body: weather({ wind: { value: '-3', unit: 'ms', kind: 'felt' } }), errors: ['weather.wind.value number.format'] },
    { what: 'B-36 a wind of 300 m/s', path: '/records', body: weather({ wind: { value: '300', unit: 'ms', kind: 'felt' } }), errors: ['weather.wind.value number.range'] },
    { what: 'B-36 humidity of 140 %', path: '/records', body: weather({ humidity: { value: '140', unit: '%', kind: 'felt' } }), errors: ['weather.humidity.value number.percent'] },
    { what: 'B-36 air of 900 °C', path: '/records', body: weather({ air: { value: '900', unit: 'degC', kind: 'felt' } }), errors: ['weather.air.value number.range'] },
  ])('$what', (row) => expectRefused(house, farm, manager, row))

  it('B-31 more than ten times the label’s most is asked about on its own: a unit may be mixed up', async () => {
    const sign = async (value: string, codes: string[]) => {
      const record = { ...buildRecord(things), components: [{ materialId: things.materialId, lotId: things.lotId, basis: { kind: 'perArea', value, unit: 'L/ha' } }] }
      await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
      const acknowledged = codes.map((code) => ({ code, reason: 'Read off the jar twice.' }))
      return manager.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD, acknowledged })
    }
    const asked = await sign('26', ['record.stop', 'lot.short'])
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ path: 'component:0', code: 'dose.unit_suspect', params: { times: 10.4 } }] })
    const signed = await sign('26', ['record.stop', 'lot.short', 'dose.unit_suspect'])
    expect(signed.status).toBe(200)
    expect(signed.body.acknowledged.map(({ code }: { code: string }) => code)).toContain('dose.unit_suspect')
    const over = await sign('25', [])
    expect(over.body.errors.map(({ code }: { code: string }) => code)).toEqual(['record.stop'])
  })

  it('B-34 more of a block than there is of it', () =>
    expectRefused(house, farm, manager, {
      what: 'a share above the whole', path: '/records',
      body: () => ({ ...buildRecord(things), lines: buildRecord(things).lines.map((line) => ({ ...line, part: { kind: 'fraction', fraction: '1.3' } })) }),
      errors: ['lines.0.part.fraction part.fraction'],
    }))

  it('B-33 more on the land than the mix makes is asked about', async () => {
    const record = buildRecord(things)
    const lines = record.lines.map((line) => ({ ...line, amount: { value: '440', unit: 'L', known: 'measured' } }))
    await manager.post(`/api/farms/${farm.id}/records`).send({ ...record, lines }).expect(201)
    const asked = await manager.post(`/api/farms/${farm.id}/records/${record.id}/sign`).send({ password: PASSWORD, acknowledged: [{ code: 'record.stop', reason: 'So it was.' }] })
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ code: 'total.inconsistent', params: { applied: 440, total: 420 } }] })
  })
})

describe('what only the server says', () => {
  it.each(['computed', 'totalAmount', 'state', 'status', 'seq', 'number', 'digest', 'hash', 'createdBy', 'enteredById', 'signedAt', 'farmId'])('B-35 %s of a record is refused', (field) =>
    expectRefused(house, farm, manager, { what: field, path: '/records', body: () => ({ ...buildRecord(things), [field]: 1 }), errors: [`${field} unknown_field`] }))

  it.each(['areaM2', 'version', 'revision', 'farmId', 'createdAt'])('B-35, B-101 %s of a block is refused', (field) =>
    expectRefused(house, farm, manager, { what: field, path: '/blocks', body: () => ({ ...buildBlock({ code: 'F', geometry: squareAt(9) }), [field]: 1 }), errors: [`${field} unknown_field`] }))

  it('B-38 a number that no column holds', async () => {
    const body = { id: uuidV7(), revision: 2_147_483_648, left: { value: '5', unit: 'L' }, reason: 'Counted.' }
    const counted = await manager.post(`/api/farms/${farm.id}/lots/${things.lotId}/count`).send(body).expect(422)
    expect(faultsOf(counted.body)).toEqual(['revision field.too_big'])
    const record = buildRecord(things)
    await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    const { id, ...content } = record
    const written = await manager.put(`/api/farms/${farm.id}/records/${id}`).send({ ...content, revision: 2_147_483_648 }).expect(422)
    expect(faultsOf(written.body)).toEqual(['revision field.too_big'])
  })
})
