import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildPicture } from '../support/buildFiles.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent
let worker: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
  worker = await house.as(farm.accounts.applicator)
})
afterAll(() => house.close())

const address = (rest = '') => `/api/farms/${farm.id}/person-papers${rest}`
const build = (changes: object = {}) => ({
  id: uuidV7(), personId: farm.personIds.applicator, kind: 'licence', title: 'Applicator licence', number: 'PA-7714', issuedOn: '2024-07-01', expiresOn: '2026-07-01', ...changes,
})

describe('training and licences', () => {
  it('are written down once, and written anew over the revision that was seen', async () => {
    const paper = build()
    await manager.post(address()).send(paper).expect(201)
    expect((await manager.post(address()).send(paper).expect(200)).body).toMatchObject({ id: paper.id, person: { id: paper.personId }, revision: 1, files: [] })
    const { id, personId, ...fields } = paper
    await manager.put(address(`/${id}`)).send({ ...fields, revision: 1, expiresOn: '2028-07-01' }).expect(200)
    expect((await manager.put(address(`/${id}`)).send({ ...fields, revision: 1 })).status).toBe(409)
    await manager.put(address(`/${id}`)).send({ ...fields, revision: 2, ended: true }).expect(200)
    expect((await manager.get(address(`?person=${personId}`)).expect(200)).body.items).toEqual([])
  })

  it('are of people of the farm, and do not run out before they were issued', async () => {
    expect((await manager.post(address()).send(build({ personId: uuidV7() }))).body.errors).toMatchObject([{ path: 'personId', code: 'person.unknown' }])
    expect((await manager.post(address()).send(build({ expiresOn: '2024-06-30' }))).body.errors).toMatchObject([{ path: 'expiresOn', code: 'paper.days' }])
  })

  it('are listed by when they run out, those of who left are not asked about', async () => {
    const [late, soon, never] = [build({ title: 'Late', expiresOn: '2027-01-01' }), build({ title: 'Soon', expiresOn: '2026-06-20' }), build({ title: 'Never', kind: 'training', expiresOn: null })]
    const left = build({ title: 'Left', personId: farm.personIds.manager, expiresOn: '2026-06-21' })
    for (const paper of [late, soon, never, left]) await manager.post(address()).send(paper).expect(201)
    const titles = async (query: string) => ((await worker.get(address(query)).expect(200)).body.items as { title: string }[]).map(({ title }) => title)
    expect(await titles('')).toEqual(['Soon', 'Left', 'Late', 'Never'])
    expect(await titles('?expiresUntil=2026-07-16')).toEqual(['Soon', 'Left'])
    const owner = await house.as(farm.accounts.owner)
    await owner.patch(`/api/farms/${farm.id}/people/${farm.personIds.manager}`).send({ revision: 1, active: false, password: PASSWORD }).expect(200)
    expect(await titles('?expiresUntil=2026-07-16')).toEqual(['Soon'])
    await owner.patch(`/api/farms/${farm.id}/people/${farm.personIds.manager}`).send({ revision: 2, active: true, password: PASSWORD }).expect(200)
    manager = await house.as(farm.accounts.manager)
  })

  it('keep the paper itself, which who does not lead the farm reads and does not change', async () => {
    const paper = build()
    await manager.post(address()).send(paper).expect(201)
    const fileId = uuidV7()
    const picture = await buildPicture('png')
    const send = (agent: Agent, id = fileId) => agent.post(address(`/${paper.id}/files`)).field({ id, kind: 'paper' }).attach('file', picture, 'licence.png')
    expect((await send(manager)).status).toBe(201)
    expect((await send(worker, uuidV7())).status).toBe(403)
    const { body } = await worker.get(address(`?person=${paper.personId}`)).expect(200)
    expect((body.items as { id: string; files: object[] }[]).find(({ id }) => id === paper.id)?.files).toMatchObject([{ id: fileId, label: 'licence.png' }])
    expect((await worker.get(`/api/farms/${farm.id}/files/${fileId}`)).status).toBe(200)
    expect((await worker.delete(`/api/farms/${farm.id}/files/${fileId}`)).status).toBe(403)
    expect((await (await house.as(farm.accounts.certifier)).get(`/api/farms/${farm.id}/files/${fileId}`)).status).toBe(404)
    expect((await manager.delete(`/api/farms/${farm.id}/files/${fileId}`)).status).toBe(204)
  })
})
