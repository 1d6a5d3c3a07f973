import { gzipSync } from 'node:zlib'
import supertest from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildMaterial, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'
import { faultsOf, stateOf } from '../support/sendBad.ts'

/** Requests that are bent, repeated or somebody else's; rows of the catalogue of bad input, section protocol, identity, concurrency. */
let house: TestHouse
let farm: TestFarm
let theirs: TestFarm
let things: SeededThings
let theirThings: SeededThings
let manager: Agent
let applicator: Agent
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  theirs = await house.makeFarm()
  things = await seedThings(house, farm)
  theirThings = await seedThings(house, theirs)
  manager = await house.as(farm.accounts.manager)
  applicator = await house.as(farm.accounts.applicator)
  certifier = await house.as(farm.accounts.certifier)
})
afterAll(() => house.close())

const address = (rest: string) => `/api/farms/${farm.id}${rest}`

describe('the same thing again', () => {
  it('B-93, B-98 is one thing, however often it is sent', async () => {
    const record = buildRecord(things)
    const first = await manager.post(address('/records')).send(record).expect(201)
    const after = await stateOf(house, farm.id)
    for (let time = 0; time < 3; time += 1) expect((await manager.post(address('/records')).send(record).expect(200)).body).toEqual(first.body)
    expect(await stateOf(house, farm.id)).toEqual(after)
  })

  it('B-94 under the same id with other content is refused', async () => {
    const material = buildMaterial({ name: 'First' })
    await manager.post(address('/materials')).send(material).expect(201)
    const { body } = await manager.post(address('/materials')).send({ ...material, name: 'Second' }).expect(422)
    expect(faultsOf(body)).toEqual(['id idempotency.mismatch'])
  })

  it('B-95 under an id of another farm is a thing of this farm', async () => {
    const material = buildMaterial({ id: theirThings.materialId, name: 'Same id' })
    expect((await manager.post(address('/materials')).send(material)).status).toBe(201)
  })

  it('B-96 at the same moment is one thing', async () => {
    const record = buildRecord(things)
    const answers = await Promise.all([1, 2, 3, 4].map(() => manager.post(address('/records')).send(record)))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 200, 201])
    for (const { body } of answers) expect(body).toEqual(answers[0]?.body)
  })

  it('B-97 on purpose the revision stands in the body: another one is 409 with the record as it is, none is 422', async () => {
    const { id, ...content } = buildRecord(things)
    await manager.post(address('/records')).send({ ...content, id }).expect(201)
    const stale = await manager.put(address(`/records/${id}`)).send({ ...content, notes: 'Other', revision: 5 }).expect(409)
    expect(stale.body).toMatchObject({ code: 'stale', current: { id, revision: 1 } })
    expect(faultsOf((await manager.put(address(`/records/${id}`)).send(content).expect(422)).body)).toEqual(['revision field.required'])
  })
})

describe('what is not one’s own', () => {
  it('B-99 a record of another farm is like one that is not', async () => {
    const record = buildRecord(theirThings)
    await (await house.as(theirs.accounts.manager)).post(`/api/farms/${theirs.id}/records`).send(record).expect(201)
    const { id, ...content } = record
    for (const there of [address(`/records/${id}`), `/api/farms/${theirs.id}/records/${id}`]) {
      const answers = [
        await manager.get(there), await manager.get(`${there}/pdf`),
        await manager.put(there).send({ ...content, revision: 1 }), await manager.post(`${there}/sign`).send({ password: PASSWORD }),
      ]
      expect(answers.map(({ status }) => status)).toEqual([404, 404, 404, 404])
    }
  })

  it('B-100 a block of another farm is no block', async () => {
    const { body } = await manager.post(address('/records')).send(buildRecord({ ...things, blockId: theirThings.blockId })).expect(422)
    expect(faultsOf(body)).toEqual(['lines.0.blockId block.unknown'])
  })

  it('B-101, B-102 neither the farm nor a role is taken from the body', async () => {
    const record = await manager.post(address('/records')).send({ ...buildRecord(things), farmId: theirs.id }).expect(422)
    expect(faultsOf(record.body)).toEqual(['farmId unknown_field'])
    const made = await manager.post('/api/farms').send({ id: uuidV7(), name: 'N', zone: 'Pacific/Honolulu', seasonStart: '01-01', role: 'owner' }).expect(422)
    expect(faultsOf(made.body)).toEqual(['role unknown_field'])
    const signIn = await manager.post('/api/session').send({ email: farm.accounts.manager.email, password: PASSWORD, role: 'owner' }).expect(422)
    expect(faultsOf(signIn.body)).toEqual(['role unknown_field'])
  })

  it('B-103 a colleague’s record is not an applicator’s to write or to sign', async () => {
    const { id, ...content } = buildRecord(things)
    await manager.post(address('/records')).send({ ...content, id }).expect(201)
    const answers = [
      await applicator.put(address(`/records/${id}`)).send({ ...content, revision: 1 }),
      await applicator.post(address(`/records/${id}/sign`)).send({ password: PASSWORD }),
    ]
    expect(answers.map(({ status }) => status)).toEqual([403, 403])
  })

  it('B-104, B-105 a certifier writes nothing and sees no season that was not granted', async () => {
    const before = await stateOf(house, farm.id)
    await certifier.post(address('/blocks')).send(buildBlock({ code: 'C', geometry: squareAt(5) })).expect(403)
    await certifier.post(address('/records')).send(buildRecord(things)).expect(403)
    await certifier.post(address(`/lots/${things.lotId}/count`)).send({}).expect(403)
    expect(await stateOf(house, farm.id)).toEqual(before)
    expect((await certifier.get(address('/records')).expect(200)).body.items).toEqual([])
  })
})

describe('a request that is bent', () => {
  it('B-109 a form of another site, with the cookie', async () => {
    const before = await stateOf(house, farm.id)
    const { headers } = await supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.manager.email, password: PASSWORD })
    const cookie = (headers['set-cookie'] as unknown as string[]).map((each) => each.split(';')[0]).join('; ')
    for (const type of ['application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'text/plain', 'application/json']) {
      const { body } = await supertest(house.app).post(address('/blocks')).set({ Cookie: cookie, 'Content-Type': type, Origin: 'https://evil.example' }).send(JSON.stringify(buildBlock())).expect(403)
      expect(body.code).toBe('foreign_request')
    }
    expect(await stateOf(house, farm.id)).toEqual(before)
  })

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'application/xml'])('B-110 JSON that is called %s', async (type) => {
    await manager.post(address('/blocks')).set('Content-Type', type).send(JSON.stringify(buildBlock())).expect(415)
  })

  it.each(['{"a":', '5', '"text"', 'null', '{a:1}', '[1,]'])('B-111 a body that is no object: %s', async (text) => {
    const response = await manager.post(address('/materials')).set('Content-Type', 'application/json').send(text)
    expect([response.status, response.type]).toEqual([400, 'application/problem+json'])
  })

  it('B-111 a list where an object is asked for', async () => {
    const response = await manager.post(address('/materials')).set('Content-Type', 'application/json').send('[]')
    expect(response.status).toBe(422)
  })

  it('B-112 50 MB packed into 50 kB', async () => {
    const packed = gzipSync(Buffer.from(`{"name":"${'a'.repeat(50_000_000)}"}`))
    expect(packed.length).toBeLessThan(60_000)
    const { body } = await manager.post(address('/materials')).set({ 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' })
      .serialize((value: unknown) => value as string).send(packed).expect(413)
    expect(body.code).toBe('too_large')
  })

  it.each(['/records/%E0%A4%A', '/blocks/%'])('B-113 an address that is no UTF-8: %s', async (rest) => {
    const response = await manager.get(address(rest))
    expect([response.status, response.type]).toEqual([400, 'application/problem+json'])
  })

  it.each(['limit=1&limit=2', 'a[b]=1', 'limit[]=1', 'limit=1e9', 'limit=-1', 'limit=0', 'limit=201', 'sort=password', 'sort=id;drop', 'state=gone', 'state=draft&state=signed'])('B-114, B-115, B-116 a question of ?%s', async (query) => {
    await manager.get(address(`/records?${query}`)).expect(422)
  })

  it('B-117, B-128 a method that an address does not have', async () => {
    const record = buildRecord(things)
    await manager.post(address('/records')).send(record).expect(201)
    const before = await stateOf(house, farm.id)
    const removed = await manager.delete(address(`/records/${record.id}`)).expect(405)
    expect(removed.get('Allow')).toBe('GET, PUT')
    for (const method of ['TRACE', 'PROPFIND', 'PATCH'] as const) {
      const response = await new supertest.Test(house.app, method, address(`/records/${record.id}`)).set('X-Requested-With', 'drenchleaf')
      expect([method, response.status, response.get('Allow')]).toEqual([method, 405, 'GET, PUT'])
    }
    await manager.post(address(`/records/${record.id}`)).set('X-HTTP-Method-Override', 'DELETE').send({}).expect(405)
    await manager.get(address(`/records/${record.id}?_method=DELETE`)).expect(422)
    expect(await stateOf(house, farm.id)).toEqual(before)
  })

  it('B-118 addresses that a stranger makes up do not reset the count of guesses', async () => {
    const guess = (index: number) => supertest(house.app).post('/api/session')
      .set({ 'X-Requested-With': 'drenchleaf', 'X-Forwarded-For': `198.51.100.${index}`, Forwarded: `for=198.51.100.${index}` })
      .send({ email: theirs.accounts.owner.email, password: `guess ${index}` })
    const statuses: number[] = []
    for (let index = 0; index < 6; index += 1) statuses.push((await guess(index)).status)
    expect(statuses).toEqual([401, 401, 401, 401, 401, 429])
  })
})
