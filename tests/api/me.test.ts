import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { openHouse, NOW, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const OTHER_PASSWORD = 'seven herons on a fence'

let house: TestHouse
let farm: TestFarm
let manager: Agent

beforeAll(async () => { house = await openHouse({ config: { sessionsPerAccount: 5 } }) })
afterAll(() => house.close())
beforeEach(async () => {
  house.setNow(NOW)
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
})

describe('one’s own profile', () => {
  it('takes name, language and preferences, each on its own, and gives them back on the next device', async () => {
    const measures = [{ name: 'blue bucket', value: '12', unit: 'L' }]
    await manager.patch('/api/me').send({ revision: 1, name: 'Oda Verrill', language: 'es', preferences: { measures } }).expect(200)
    await manager.patch('/api/me').send({ revision: 2, preferences: { units: 'us', light: 'dawn' } }).expect(200)
    const { body } = await (await house.as(farm.accounts.manager)).get('/api/session').expect(200)
    expect(body.user).toMatchObject({ name: 'Oda Verrill', language: 'es', preferences: { measures, units: 'us', light: 'dawn' }, revision: 3 })
  })

  it('is not written over what another device wrote meanwhile, and takes no role: 409, 422', async () => {
    await manager.patch('/api/me').send({ revision: 1, name: 'Oda' }).expect(200)
    expect((await manager.patch('/api/me').send({ revision: 1, name: 'Odo' })).status).toBe(409)
    expect((await manager.patch('/api/me').send({ revision: 2, role: 'owner' })).status).toBe(422)
  })
})

describe('another password', () => {
  const change = (body: object) => manager.put('/api/me/password').send({ password: PASSWORD, newPassword: OTHER_PASSWORD, ...body })
  const signIn = (password: string) =>
    supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.manager.email, password })

  it('is taken for the one that stands, and ends the other sessions', async () => {
    const other = await house.as(farm.accounts.manager)
    expect((await change({ password: 'not the password' })).body.errors).toMatchObject([{ path: 'password', code: 'session.wrong_password' }])
    await change({}).expect(204)
    expect((await manager.get('/api/session')).status).toBe(200)
    expect((await other.get('/api/session')).status).toBe(401)
    expect((await signIn(PASSWORD)).status).toBe(401)
    expect((await signIn(OTHER_PASSWORD)).status).toBe(200)
  })

  it.each([
    { newPassword: 'eleven long', code: 'welcome.password_short' },
    { newPassword: 'passwordpassword', code: 'welcome.password_known' },
    { newPassword: 'drenchleaf owner 1', code: 'welcome.password_known' },
  ])('is refused when it is $newPassword', async ({ newPassword, code }) => {
    expect((await change({ newPassword })).body.errors).toMatchObject([{ path: 'newPassword', code }])
  })

  it('is refused when it is its farm’s name with little beside, and beyond 256 signs', async () => {
    const { body } = await manager.get(`/api/farms/${farm.id}`).expect(200)
    expect((await change({ newPassword: `${body.name} 2026` })).body.errors).toMatchObject([{ path: 'newPassword', code: 'welcome.password_known' }])
    expect((await change({ newPassword: 'x'.repeat(257) })).body.errors).toMatchObject([{ path: 'newPassword', code: 'text.too_long' }])
  })

  it('is taken as typed: spaces, signs beyond the alphabet, 64 characters', async () => {
    const newPassword = `  Zwölf Frösche 🐸 ${'x'.repeat(44)}  `
    await change({ newPassword }).expect(204)
    expect((await signIn(newPassword)).status).toBe(200)
    expect((await signIn(newPassword.trim())).status).toBe(401)
  })
})

describe('one’s own sessions', () => {
  it('are shown with device and times, without what opens them, and ended one by one', async () => {
    const phone = supertest.agent(house.app)
    void phone.set({ 'X-Requested-With': 'drenchleaf', 'User-Agent': 'Mozilla/5.0 (Android 15; Mobile; rv:140.0) Gecko/140.0 Firefox/140.0' })
    await phone.post('/api/session').send({ email: farm.accounts.manager.email, password: PASSWORD }).expect(200)
    house.setNow('2026-06-16T16:00:00.000Z')
    await phone.get('/api/session').expect(200)
    house.setNow('2026-06-16T16:10:00.000Z')
    const { body } = await manager.get('/api/me/sessions').expect(200)
    expect(body.items).toMatchObject([
      { isThis: true, openedAt: NOW, seenAt: '2026-06-16T16:10:00.000Z' },
      { isThis: false, device: 'Firefox, Android', openedAt: NOW, seenAt: '2026-06-16T16:00:00.000Z', endsAt: '2026-06-30T16:00:00.000Z' },
    ])
    expect(Object.keys(body.items[0]).sort()).toEqual(['device', 'endsAt', 'id', 'isThis', 'onSharedPhone', 'openedAt', 'seenAt'])
    await manager.delete(`/api/me/sessions/${body.items[1].id}`).expect(204)
    expect((await phone.get('/api/session')).status).toBe(401)
  })

  it('of somebody else are not there', async () => {
    const owner = await house.as(farm.accounts.owner)
    const [{ id }] = (await owner.get('/api/me/sessions').expect(200)).body.items as [{ id: string }]
    expect((await manager.delete(`/api/me/sessions/${id}`)).status).toBe(404)
    expect((await owner.get('/api/session')).status).toBe(200)
  })

  it('are five at most: with the sixth the one not seen for longest ends', async () => {
    const agents = [manager]
    for (let hour = 15; hour < 19; hour += 1) {
      house.setNow(`2026-06-16T${hour}:00:00.000Z`)
      agents.push(await house.as(farm.accounts.manager))
    }
    house.setNow('2026-06-16T20:00:00.000Z')
    await manager.get('/api/session').expect(200)
    await house.as(farm.accounts.manager)
    const statuses = await Promise.all(agents.map(async (agent) => (await agent.get('/api/session')).status))
    expect(statuses).toEqual([200, 401, 200, 200, 200])
  })
})
