import { generate } from 'otplib'
import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent
let clock: number

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
beforeEach(async () => {
  clock = Date.parse('2026-06-16T14:00:10.000Z')
  house.setNow(new Date(clock).toISOString())
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
})

/** Turns the clock on by so many steps of 30 seconds. */
function wait(steps: number): void {
  clock += steps * 30_000
  house.setNow(new Date(clock).toISOString())
}
const codeOf = (secret: string, steps = 0) => generate({ secret, epoch: Math.floor(clock / 1000) + steps * 30 })
const signIn = (code?: string, who: 'owner' | 'manager' = 'owner') =>
  supertest.agent(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts[who].email, password: PASSWORD, code })

/** Sets a second factor up. @returns its secret and the recovery codes. */
async function setUp(agent: Agent): Promise<{ secret: string; codes: string[] }> {
  const offer = await agent.post('/api/me/second-factor').send({ password: PASSWORD }).expect(200)
  const { secret } = offer.body as { secret: string }
  const { body } = await agent.put('/api/me/second-factor').send({ code: await codeOf(secret) }).expect(200)
  return { secret, codes: body.codes as string[] }
}

describe('setting a second factor up', () => {
  it('asks the password, and changes nothing before a code of it was given', async () => {
    expect((await owner.post('/api/me/second-factor').send({ password: 'a guess' })).status).toBe(422)
    const { body } = await owner.post('/api/me/second-factor').send({ password: PASSWORD }).expect(200)
    expect(body).toMatchObject({ secret: expect.stringMatching(/^[A-Z2-7]{32}$/), picture: expect.stringContaining('data:image/svg+xml') })
    expect((await signIn()).status).toBe(200)
    expect((await owner.put('/api/me/second-factor').send({ code: '000000' })).body.code).toBe('factor.wrong')
    expect((await signIn()).status).toBe(200)
  })

  it('gives ten recovery codes once, ends other sessions, and keeps neither secret nor codes in the clear', async () => {
    const other = await house.as(farm.accounts.owner)
    const { secret, codes } = await setUp(owner)
    expect(new Set(codes).size).toBe(10)
    for (const code of codes) expect(code).toMatch(/^([0-9A-HJKMNP-TV-Z]{4}-){5}[0-9A-HJKMNP-TV-Z]{4}$/)
    expect((await other.get('/api/session')).status).toBe(401)
    expect((await owner.get('/api/me/second-factor').expect(200)).body).toMatchObject({ codesLeft: 10 })
    const kept = await house.services.database.inHouse((manager) => manager.query<object[]>('SELECT a.*, c.* FROM accounts a JOIN recovery_codes c ON c.account_id = a.id'))
    expect(JSON.stringify(kept)).not.toContain(secret)
    expect(JSON.stringify(kept)).not.toContain(codes[0]?.replaceAll('-', ''))
  })
})

describe('signing in with a second factor', () => {
  it('asks for the code once the password is right, and takes each code once (B-121)', async () => {
    const { secret } = await setUp(owner)
    expect(await signIn()).toMatchObject({ status: 401, body: { code: 'session.code_needed' } })
    expect(await signIn('000000')).toMatchObject({ status: 401, body: { code: 'session.code_wrong' } })
    wait(1)
    const code = await codeOf(secret)
    expect((await signIn(code)).status).toBe(200)
    expect(await signIn(code)).toMatchObject({ status: 401, body: { code: 'session.code_wrong' } })
  })

  it('does not take the code that set it up, nor two at one moment', async () => {
    const { secret } = await setUp(owner)
    expect((await signIn(await codeOf(secret))).status).toBe(401)
    wait(1)
    const code = await codeOf(secret)
    const both = await Promise.all([signIn(code), signIn(code)])
    expect(both.map(({ status }) => status).sort()).toEqual([200, 401])
  })

  it('takes a code of the step before or after, and none further off', async () => {
    const { secret } = await setUp(owner)
    wait(10)
    expect((await signIn(await codeOf(secret, -2))).status).toBe(401)
    expect((await signIn(await codeOf(secret, -1))).status).toBe(200)
    expect((await signIn(await codeOf(secret, 1))).status).toBe(200)
    wait(5)
    expect((await signIn(await codeOf(secret, 2))).status).toBe(401)
  })

  it('takes each recovery code once, however it is typed', async () => {
    const { codes } = await setUp(owner)
    const [first = ''] = codes
    expect((await signIn(first.toLowerCase().replaceAll('-', ' '))).status).toBe(200)
    expect((await signIn(first)).status).toBe(401)
    expect((await owner.get('/api/me/second-factor')).body).toMatchObject({ codesLeft: 9 })
  })

  it('gives a new session id, and the wrong password says nothing of a factor', async () => {
    await setUp(owner)
    const wrong = await supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.owner.email, password: 'a guess' })
    expect(wrong.body.code).toBe('session.wrong')
  })
})

describe('a second factor that stands', () => {
  it('is changed and taken away with password and code together', async () => {
    const { secret, codes } = await setUp(owner)
    expect((await owner.post('/api/me/second-factor').send({ password: PASSWORD })).body.code).toBe('factor.wrong')
    expect((await owner.post('/api/me/second-factor/remove').send({ password: PASSWORD, code: '000000' })).body.code).toBe('factor.wrong')
    const renewed = await owner.post('/api/me/second-factor/codes').send({ password: PASSWORD, code: codes[1] }).expect(200)
    expect((await signIn(codes[0])).status).toBe(401)
    expect((await signIn((renewed.body.codes as string[])[0])).status).toBe(200)
    wait(1)
    await owner.post('/api/me/second-factor/remove').send({ password: PASSWORD, code: await codeOf(secret) }).expect(204)
    expect((await signIn()).status).toBe(200)
  })

  it('is taken from a member by the owner, and not by the owner of one of several farms', async () => {
    const manager = await house.as(farm.accounts.manager)
    await setUp(manager)
    const other = await house.makeFarm()
    const address = `/api/farms/${farm.id}/people/${farm.personIds.manager}/reset-factor`
    const rebind = (accountId: string) => house.services.database.inFarm({ farmId: other.id, seasons: null }, (db) =>
      db.query('UPDATE people SET account_id = $1 WHERE id = $2', [accountId, other.personIds.manager]))
    await rebind(farm.accounts.manager.id)
    expect((await owner.post(address).send({ password: PASSWORD })).body.errors).toMatchObject([{ code: 'person.on_other_farms' }])
    await rebind(other.accounts.manager.id)
    await owner.post(address).send({ password: PASSWORD }).expect(204)
    expect((await manager.get('/api/session')).status).toBe(401)
    expect((await signIn(undefined, 'manager')).status).toBe(200)
  })
})

describe('a farm that asks a second factor', () => {
  const ask = (asked: boolean) => owner.put(`/api/farms/${farm.id}/second-factor`).send({ asked, password: PASSWORD })

  it('opens to owner, manager and certifier once they have one, and to an applicator as before', async () => {
    expect((await ask(true)).body.errors).toMatchObject([{ code: 'factor.own_first' }])
    await setUp(owner)
    await ask(true).expect(200)
    for (const who of ['manager', 'certifier'] as const) {
      const agent = await house.as(farm.accounts[who])
      expect((await agent.get('/api/session')).body.memberships).toMatchObject([{ factorNeeded: true }])
      expect(await agent.get(`/api/farms/${farm.id}/blocks`)).toMatchObject({ status: 403, body: { code: 'session.factor_needed' } })
      await setUp(agent)
      expect((await agent.get(`/api/farms/${farm.id}/blocks`)).status).toBe(200)
    }
    const worker = await house.as(farm.accounts.applicator)
    expect((await worker.get(`/api/farms/${farm.id}/blocks`)).status).toBe(200)
    expect((await owner.get(`/api/farms/${farm.id}/blocks`)).status).toBe(200)
  })
})
