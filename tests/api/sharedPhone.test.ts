import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings } from '../support/seedThings.ts'

const PIN = '481902'
const OURS = { 'X-Requested-With': 'drenchleaf' }

let house: TestHouse
let farm: TestFarm
let owner: Agent
let personId: string
let phone: Agent
let phoneId: string

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
beforeEach(async () => {
  house.setNow(NOW)
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
  personId = uuidV7()
  await owner.post(`/api/farms/${farm.id}/people`).send({ id: personId, name: 'Wick Ansel', pin: PIN, password: PASSWORD }).expect(201)
  const enrolled = await enrol('Barn phone')
  phone = enrolled.agent
  phoneId = enrolled.id
})

/** A phone on which a manager signed in once, made it the farm's, and left. */
async function enrol(name: string): Promise<{ agent: Agent; id: string }> {
  const agent = await house.as(farm.accounts.manager)
  const id = uuidV7()
  await agent.post(`/api/farms/${farm.id}/shared-phones`).send({ id, name, password: PASSWORD }).expect(201)
  await agent.delete('/api/session').expect(204)
  return { agent, id }
}
const signIn = (on: Agent, pin = PIN, who = personId) => on.post('/api/shared-phone/session').set(OURS).send({ personId: who, pin })

describe('a shared phone', () => {
  it('names who signs in on it by PIN, and nobody else', async () => {
    const { body } = await phone.get('/api/shared-phone').expect(200)
    expect(body.phone).toEqual({ name: 'Barn phone', farmName: expect.any(String), people: [{ id: personId, name: 'Wick Ansel' }] })
    expect((await supertest(house.app).get('/api/shared-phone').expect(200)).body).toEqual({ phone: null })
  })

  it('is enrolled with a password, by who leads the farm alone', async () => {
    const body = { id: uuidV7(), name: 'Van phone', password: PASSWORD }
    const worker = await house.as(farm.accounts.applicator)
    expect((await worker.post(`/api/farms/${farm.id}/shared-phones`).send(body)).status).toBe(403)
    expect((await owner.post(`/api/farms/${farm.id}/shared-phones`).send({ ...body, password: 'a guess' })).status).toBe(422)
  })

  it('is listed with its last use, and taken away: who signed in on it is out at once', async () => {
    await signIn(phone).expect(200)
    const { body } = await owner.get(`/api/farms/${farm.id}/shared-phones`).expect(200)
    expect(body.items).toMatchObject([{ id: phoneId, name: 'Barn phone', lastUsedAt: NOW, revokedAt: null }])
    await owner.post(`/api/farms/${farm.id}/shared-phones/${phoneId}/revoke`).expect(204)
    expect((await phone.get('/api/session')).status).toBe(401)
    expect((await phone.get('/api/shared-phone')).body).toEqual({ phone: null })
    expect((await signIn(phone)).body.code).toBe('pin.not_here')
  })

  it('believes no secret but its own', async () => {
    const cookie = `drenchleaf.phone=${farm.id}.${phoneId}.${'A'.repeat(43)}`
    const forged = await supertest(house.app).get('/api/shared-phone').set('Cookie', cookie)
    expect(forged.body).toEqual({ phone: null })
    const tried = await supertest(house.app).post('/api/shared-phone/session').set(OURS).set('Cookie', cookie).send({ personId, pin: PIN })
    expect(tried).toMatchObject({ status: 401, body: { code: 'pin.not_here' } })
  })
})

describe('signing in by PIN', () => {
  it('opens the farm as that person, for twelve hours', async () => {
    const { body } = await signIn(phone).expect(200)
    expect(body).toMatchObject({ user: { email: null, name: 'Wick Ansel', signsWith: 'pin' }, memberships: [{ farmId: farm.id, role: 'applicator', personId }] })
    house.setNow('2026-06-17T01:59:00.000Z')
    expect((await phone.get(`/api/farms/${farm.id}/blocks`)).status).toBe(200)
    house.setNow('2026-06-17T02:00:01.000Z')
    expect((await phone.get(`/api/farms/${farm.id}/blocks`)).status).toBe(401)
  })

  it('ends when the phone is handed over', async () => {
    await signIn(phone).expect(200)
    await phone.delete('/api/session').expect(204)
    expect((await phone.get('/api/session')).status).toBe(401)
  })

  it('works for one person on several phones at a time', async () => {
    const other = (await enrol('Van phone')).agent
    await signIn(phone).expect(200)
    await signIn(other).expect(200)
    expect((await phone.get('/api/session')).status).toBe(200)
  })

  it('says the same of a wrong PIN, of somebody with a password and of nobody at all', async () => {
    const answers = [await signIn(phone, '907315'), await signIn(phone, PIN, farm.personIds.manager), await signIn(phone, PIN, uuidV7())]
    for (const answer of answers) expect(answer).toMatchObject({ status: 401, body: { code: 'pin.wrong' } })
  })

  it('is refused for a while after five wrong PINs of one person on one phone, and for nobody else', async () => {
    const neighbourId = uuidV7()
    await owner.post(`/api/farms/${farm.id}/people`).send({ id: neighbourId, name: 'Ilsa Marrow', pin: '618204', password: PASSWORD }).expect(201)
    const other = (await enrol('Van phone')).agent
    const guesses = []
    for (let guess = 0; guess < 6; guess += 1) guesses.push((await signIn(phone, `90731${guess}`)).status)
    expect(guesses).toEqual([401, 401, 401, 401, 401, 429])
    expect((await signIn(phone)).status).toBe(429)
    expect((await signIn(phone, '618204', neighbourId)).status).toBe(200)
    expect((await signIn(other)).status).toBe(200)
  })

  it('is over for who is let go, and after the owner sets another PIN', async () => {
    await signIn(phone).expect(200)
    await owner.put(`/api/farms/${farm.id}/people/${personId}/pin`).send({ revision: 1, pin: '618204', password: PASSWORD }).expect(200)
    expect((await phone.get('/api/session')).status).toBe(401)
    await signIn(phone, '618204').expect(200)
    await owner.patch(`/api/farms/${farm.id}/people/${personId}`).send({ revision: 2, active: false, password: PASSWORD }).expect(200)
    expect((await phone.get(`/api/farms/${farm.id}/blocks`)).status).toBe(401)
    expect((await phone.get('/api/shared-phone')).body.phone.people).toEqual([])
    expect((await signIn(phone, '618204')).status).toBe(401)
  })
})

describe('a record signed by PIN', () => {
  it('asks the PIN, and says so afterwards', async () => {
    const things = await seedThings(house, farm)
    await signIn(phone).expect(200)
    const record = buildRecord(things)
    const address = `/api/farms/${farm.id}/records`
    await phone.post(address).set(OURS).send(record).expect(201)
    const wrong = await phone.post(`${address}/${record.id}/sign`).set(OURS).send({ password: '907315' })
    expect(wrong).toMatchObject({ status: 422, body: { code: 'session.wrong_pin' } })
    const signed = await phone.post(`${address}/${record.id}/sign`).set(OURS).send({ password: PIN })
    expect(signed).toMatchObject({ status: 200, body: { state: 'signed', signedBy: { id: personId }, signedWith: 'pin' } })
    const versions = await owner.get(`${address}/${record.id}/versions`).expect(200)
    expect(versions.body.items).toMatchObject([{ signedWith: 'pin' }])
  })

  it('is refused to a PIN of one’s own that anybody tries first', async () => {
    await signIn(phone).expect(200)
    const change = (newPassword: string) => phone.put('/api/me/password').set(OURS).send({ password: PIN, newPassword })
    expect((await change('111111')).body.errors).toMatchObject([{ path: 'newPassword', code: 'pin.trivial' }])
    expect((await change('618204')).status).toBe(204)
    await phone.delete('/api/session').set(OURS).expect(204)
    expect((await signIn(phone)).status).toBe(401)
    expect((await signIn(phone, '618204')).status).toBe(200)
  })
})
