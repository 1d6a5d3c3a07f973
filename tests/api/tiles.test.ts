import { afterAll, beforeAll, expect, it } from 'vitest'
import { openHouse, type Agent, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let applicator: Agent
let asked: [number, number, number][]

beforeAll(async () => {
  house = await openHouse()
  applicator = await house.as((await house.makeFarm()).accounts.applicator)
})
afterAll(() => house.close())

it('without a tile service there is no imagery to ask for', async () => {
  expect((await applicator.get('/api/config').expect(200)).body).toMatchObject({ imagery: null, demo: false })
  await applicator.get('/api/tiles/1/0/0').expect(404)
})

it('with one, its squares come by whole numbers alone, and pages are told whose they are', async () => {
  asked = []
  house.services.tiles = {
    attribution: 'Somebody', maxZoom: 18,
    read: async (...place) => {
      asked.push(place)
      return { contentType: 'image/png', bytes: Buffer.from('square') }
    },
  }
  expect((await applicator.get('/api/config').expect(200)).body.imagery).toEqual({ attribution: 'Somebody', maxZoom: 18 })
  const response = await applicator.get('/api/tiles/1/0/1').expect(200).expect('Content-Type', 'image/png').expect('X-Content-Type-Options', 'nosniff')
  expect(response.get('Cache-Control')).toMatch(/^private/)
  for (const tile of ['1e0/0/0', '0/0x0/0', '0/0/-0', '23/0/0', '0/99999999/0', '1/..%2f/0', '1/0/0.png', '1/%7Bx%7D/0']) await applicator.get(`/api/tiles/${tile}`).expect(404)
  expect(asked).toEqual([[1, 0, 1]])
})
