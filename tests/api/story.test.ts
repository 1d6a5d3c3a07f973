import { afterAll, beforeAll, expect, it } from 'vitest'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
})
afterAll(() => house.close())

it('takes a drench from draft to signature, draws its lot down and prints it', async () => {
  const applicator = await house.as(farm.accounts.applicator)
  const input = buildRecord({ ...things, purpose: 'Soil life' })
  const made = await applicator.post(`/api/farms/${farm.id}/records`).send(input)
  expect(made.body).toMatchObject({ state: 'started', number: null, computed: { waterL: 400, totalL: 420 } })
  expect(made.status).toBe(201)
  const signed = await applicator.post(`/api/farms/${farm.id}/records/${input.id}/sign`).send({ password: PASSWORD })
  expect(signed.body).toMatchObject({ state: 'signed', number: '2026-0001', seq: 1, version: 1, season: 2026 })
  expect(signed.body.digest).toMatch(/^[0-9a-f]{64}$/)
  const lots = await applicator.get(`/api/farms/${farm.id}/lots`)
  expect(lots.body.items[0].left).toEqual({ value: '80', unit: 'L' })
  const list = await applicator.get(`/api/farms/${farm.id}/records`)
  expect(list.body.items).toMatchObject([{ number: '2026-0001', state: 'signed', blocks: [{ code: 'B1' }], lots: ['N-1'] }])
  const pdf = await applicator.get(`/api/farms/${farm.id}/records/${input.id}/pdf`)
  expect(pdf.status).toBe(200)
  expect(pdf.type).toBe('application/pdf')
  expect(Buffer.from(pdf.body).subarray(0, 5).toString()).toBe('%PDF-')
})
