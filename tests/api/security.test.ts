import { Writable } from 'node:stream'
import pino from 'pino'
import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { inviteOwner } from '../../server/services/welcome.ts'
import { openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
const lines: string[] = []

beforeAll(async () => {
  const log = new Writable({
    write(chunk: Buffer, _encoding, done) {
      lines.push(...chunk.toString('utf8').trimEnd().split('\n'))
      done()
    },
  })
  house = await openHouse({ logger: pino({ level: 'info' }, log), config: { publicUrl: 'https://register.example' } })
  farm = await house.makeFarm()
})
afterAll(() => house.close())

/** As the proxy of a public address asks: by https, from an address of its own. */
const ask = (method: 'get' | 'post' | 'delete', path: string, from = '203.0.113.9') =>
  supertest(house.app)[method](path).set({ 'X-Requested-With': 'drenchleaf', 'X-Forwarded-Proto': 'https', 'X-Forwarded-For': from })
const signIn = (email: string, password: string, from?: string) => ask('post', '/api/session', from).send({ email, password })
const cookiesOf = (response: { headers: Record<string, unknown> }) => response.headers['set-cookie'] as string[]
const eventsSince = (start: number) => lines.slice(start).map((line) => JSON.parse(line) as Record<string, unknown>).filter(({ event }) => event !== undefined)

describe('a server behind https', () => {
  it('names its cookies so that no other host and no plain http can set them', async () => {
    const signedIn = await signIn(farm.accounts.owner.email, PASSWORD).expect(200)
    const [session = '', device = ''] = [...cookiesOf(signedIn)].sort()
    expect(session).toMatch(/^__Host-drenchleaf\.sid=.*; Path=\/;.*Secure/)
    expect(session).not.toContain('Domain')
    expect(device).toMatch(/^__Secure-drenchleaf\.device\.[\w-]{10}=.*Secure/)
    const cookie = session.split(';')[0] ?? ''
    await ask('get', '/api/session').set('Cookie', cookie).expect(200)
    const out = await ask('delete', '/api/session').set('Cookie', cookie).expect(204)
    expect(cookiesOf(out)[0]).toMatch(/^__Host-drenchleaf\.sid=;.*Expires=Thu, 01 Jan 1970.*Secure/)
    await ask('get', '/api/session').set('Cookie', cookie).expect(401)
  })

  it('stands in no frame, of its own pages either', async () => {
    const { headers } = await ask('get', '/api/health').expect(200)
    expect(headers['x-frame-options']).toBe('DENY')
    expect(headers['content-security-policy']).toContain("frame-ancestors 'none'")
    expect(headers['strict-transport-security']).toBeDefined()
  })
})

describe('the log', () => {
  it('has one line for each sign-in, tells of an e-mail its digest alone and keeps no password', async () => {
    const start = lines.length
    const { email } = farm.accounts.manager
    await signIn(email, PASSWORD).expect(200)
    await signIn(email.toUpperCase(), 'wrong but secret too').expect(401)
    const events = eventsSince(start)
    expect(events).toMatchObject([
      { event: 'sign-in.ok', level: 30, accountId: farm.accounts.manager.id, address: '203.0.113.9', route: '/session', method: 'POST' },
      { event: 'sign-in.failed', level: 40, code: 'session.wrong', address: '203.0.113.9' },
    ])
    expect(events[0]?.email).toMatch(/^[0-9a-f]{16}$/)
    expect(events[1]?.email).toBe(events[0]?.email)
    const text = lines.slice(start).join('\n').toLowerCase()
    for (const secret of [email, PASSWORD, 'wrong but secret']) expect(text).not.toContain(secret)
  })

  it('B-71: stays one JSON line, whatever is typed', async () => {
    const start = lines.length
    await signIn('a@b.example\n{"level":30,"event":"sign-in.ok"}', 'x').expect(401)
    expect(eventsSince(start).map(({ event }) => event)).toEqual(['sign-in.failed'])
  })

  it('tells what was forbidden, where, to whom', async () => {
    const start = lines.length
    const [cookie = ''] = [...cookiesOf(await signIn(farm.accounts.applicator.email, PASSWORD))].sort()
    await ask('post', `/api/farms/${farm.id}/blocks`).set('Cookie', cookie).send({}).expect(403)
    await supertest(house.app).post('/api/farms').send({}).expect(403)
    expect(eventsSince(start).slice(1)).toMatchObject([
      { event: 'forbidden', code: 'forbidden', farmId: farm.id, accountId: farm.accounts.applicator.id, route: '/farms/:farmId/blocks', method: 'POST' },
      { event: 'forbidden', code: 'foreign_request' },
    ])
  })

  it('tells that an address was limited', async () => {
    const start = lines.length
    const from = '203.0.113.77'
    for (let guess = 0; guess < 5; guess += 1) await signIn(farm.accounts.owner.email, `guess ${guess}`, from).expect(401)
    await signIn(farm.accounts.owner.email, 'guess 5', from).expect(429)
    expect(eventsSince(start).map(({ event }) => event)).toEqual([...Array<string>(5).fill('sign-in.failed'), 'limited'])
    expect(eventsSince(start).at(-1)).toMatchObject({ address: from, code: 'too_many' })
  })

  it('tells that a password was taken, and not the link it was taken by', async () => {
    const start = lines.length
    const { token } = await inviteOwner(house.services, 'new@farm.example')
    await ask('post', '/api/welcome').send({ token, name: 'New', password: 'another long password' }).expect(204)
    expect(eventsSince(start)).toMatchObject([{ event: 'password.changed', route: '/welcome' }])
    expect(lines.slice(start).join('\n')).not.toContain(token)
  })
})

describe('what one account can pile up', () => {
  it('ends at a number of farms', async () => {
    const few = await openHouse({ config: { farmsPerAccount: 2 } })
    const { accounts } = await few.makeFarm()
    const owner = await few.as(accounts.owner)
    const farmOf = (name: string) => ({ id: uuidV7(), name, zone: 'Pacific/Honolulu', seasonStart: '01-01' })
    const second = farmOf('Second')
    const answers = await Promise.all([second, farmOf('Third'), farmOf('Fourth')].map((body) => owner.post('/api/farms').send(body)))
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 422, 422])
    const refused = answers.find(({ status }) => status === 422)
    expect(refused?.body.errors).toMatchObject([{ path: 'id', code: 'farm.too_many', message: 'One account owns at most 2 farms here. Ask whoever runs this server for more.' }])
    const made = answers.findIndex(({ status }) => status === 201)
    if (made === 0) await owner.post('/api/farms').send(second).expect(200)
    expect((await owner.get('/api/session')).body.memberships).toHaveLength(2)
    const manager = await few.as(accounts.manager)
    await manager.post('/api/farms').send(farmOf('Of another')).expect(201)
    await few.close()
  })

  it('B-35: is told of twenty faults and how many more there are', async () => {
    const flood = Object.fromEntries(Array.from({ length: 1000 }, (_, index) => [`key${index}`, index]))
    const [cookie = ''] = [...cookiesOf(await signIn(farm.accounts.owner.email, PASSWORD))].sort()
    const body = { id: uuidV7(), name: 'N', zone: 'Pacific/Honolulu', seasonStart: '01-01', ...flood }
    const response = await ask('post', '/api/farms').set('Cookie', cookie).send(body).expect(422)
    expect(response.body.errors).toHaveLength(21)
    expect(response.body.errors.at(-1)).toMatchObject({ path: '', code: 'more', message: 'And 980 more.' })
    expect(JSON.stringify(response.body).length).toBeLessThan(5_000)
  })
})
