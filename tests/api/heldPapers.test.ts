import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildPicture } from '../support/buildFiles.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let other: TestFarm
let things: SeededThings
let manager: Agent
let worker: Agent
let certifier: Agent
const certificateId = uuidV7()

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  other = await house.makeFarm()
  things = await seedThings(house, farm)
  manager = await house.as(farm.accounts.manager)
  worker = await house.as(farm.accounts.applicator)
  certifier = await house.as(farm.accounts.certifier)
  await manager.post(`/api/farms/${farm.id}/certificates`).send({ id: certificateId, number: 'C-17', body: 'Thornfield Review', validFrom: '2026-02-01' }).expect(201)
})
afterAll(() => house.close())

const landOf = (farmId: string, blockId: string) => `/api/farms/${farmId}/blocks/${blockId}/papers`
const add = async (agent: Agent, address: string, id = uuidV7()) => agent.post(address).field('id', id).field('kind', 'paper').attach('file', await buildPicture(), 'proof of 2023.jpg')

describe('papers of what is no record', () => {
  it.each([
    ['the land of a block', () => landOf(farm.id, things.blockId)], ['a certificate', () => `/api/farms/${farm.id}/certificates/${certificateId}/papers`],
  ])('%s: added once, read by the farm’s people, opened, taken back', async (_what, addressOf) => {
    const address = addressOf()
    const id = uuidV7()
    expect((await add(manager, address, id)).status).toBe(201)
    expect((await add(manager, address, id)).status).toBe(200)
    expect((await worker.get(address).expect(200)).body.items).toMatchObject([{ id, label: 'proof of 2023.jpg', kind: 'paper' }])
    await worker.get(`/api/farms/${farm.id}/files/${id}`).expect(200)
    expect((await add(worker, address)).status).toBe(403)
    expect((await worker.delete(`/api/farms/${farm.id}/files/${id}`)).status).toBe(403)
    expect((await certifier.get(address)).status).toBe(403)
    expect((await certifier.get(`/api/farms/${farm.id}/files/${id}`)).status).toBe(404)
    await manager.delete(`/api/farms/${farm.id}/files/${id}`).expect(204)
    expect((await manager.get(address).expect(200)).body.items).toEqual([])
  })

  it('are of things of this farm alone', async () => {
    const elsewhere = await seedThings(house, other)
    expect((await add(manager, landOf(farm.id, elsewhere.blockId))).status).toBe(404)
    expect((await add(manager, landOf(farm.id, uuidV7()))).status).toBe(404)
    expect((await manager.get(`/api/farms/${farm.id}/calibrations/${uuidV7()}/papers`)).status).toBe(404)
  })
})
