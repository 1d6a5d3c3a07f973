import { once } from 'node:events'
import { Agent as HttpAgent, request as httpRequest } from 'node:http'
import type { AddressInfo } from 'node:net'
import supertest from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { recordStatements } from '../support/recordStatements.ts'
import { openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
})
afterAll(() => house.close())

const signIn = (email: string, password: string) =>
  supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email, password })

const sessionCookie = (response: { headers: Record<string, unknown> }): string => {
  const cookies = response.headers['set-cookie'] as string[] | undefined
  return cookies?.find((cookie) => cookie.startsWith('drenchleaf.sid='))?.split(';')[0] ?? ''
}

describe('signing in', () => {
  it('answers who one is and which farms are open', async () => {
    const { status, body } = await signIn(farm.accounts.manager.email, PASSWORD)
    expect(status).toBe(200)
    expect(body).toMatchObject({ user: { email: farm.accounts.manager.email }, memberships: [{ farmId: farm.id, role: 'manager', seasons: null }] })
    expect(JSON.stringify(body)).not.toContain('argon2')
  })

  it('tells a certifier which seasons are granted', async () => {
    const { body } = await signIn(farm.accounts.certifier.email, PASSWORD)
    expect(body.memberships).toMatchObject([{ role: 'certifier', personId: null, seasons: [2026] }])
  })

  it('finds the e-mail whatever its case, and takes the password only as it is', async () => {
    expect((await signIn(farm.accounts.owner.email.toUpperCase(), PASSWORD)).status).toBe(200)
    expect((await signIn(farm.accounts.owner.email, PASSWORD.toUpperCase())).status).toBe(401)
    expect((await signIn(farm.accounts.owner.email, `${PASSWORD} `)).status).toBe(401)
  })

  it('says the same of a wrong password and of an unknown e-mail', async () => {
    const known = await signIn(farm.accounts.manager.email, 'not the password')
    const unknown = await signIn('nobody@farm.example', 'not the password')
    expect(known.status).toBe(401)
    expect({ ...known.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
  })

  // How long it takes is no test's matter: the same work takes as long. The hash itself is made for both (`verifyPassword`).
  it('asks the database the same for an unknown e-mail as for a wrong password (6.3.8)', async () => {
    const asked = (email: string) => recordStatements(() => signIn(email, 'not the password'))
    const [known, unknown] = [await asked(farm.accounts.manager.email), await asked('nobody-else@farm.example')]
    expect(unknown.map(({ text }) => text)).toEqual(known.map(({ text }) => text))
    expect(known.length).toBeGreaterThan(1)
  })

  it('B-108: gives a new session id and ends the one that was sent', async () => {
    const agent = supertest.agent(house.app)
    const send = () => agent.post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: farm.accounts.owner.email, password: PASSWORD })
    const first = sessionCookie(await send())
    const second = sessionCookie(await send())
    expect(first).not.toBe('')
    expect(second).not.toBe(first)
    expect((await supertest(house.app).get('/api/session').set('Cookie', first)).status).toBe(401)
    expect((await supertest(house.app).get('/api/session').set('Cookie', second)).status).toBe(200)
  })

  it('B-107: ends with signing out: the old cookie opens nothing', async () => {
    const signedIn = await signIn(farm.accounts.owner.email, PASSWORD)
    const cookie = sessionCookie(signedIn)
    await supertest(house.app).delete('/api/session').set('X-Requested-With', 'drenchleaf').set('Cookie', cookie).expect(204)
    expect((await supertest(house.app).get('/api/session').set('Cookie', cookie)).status).toBe(401)
  })

  it('B-106: ends at once for an account that was closed', async () => {
    const other = await house.makeFarm()
    const agent = await house.as(other.accounts.manager)
    await house.services.database.inHouse((manager) => manager.query('UPDATE accounts SET deactivated_at = now() WHERE id = $1', [other.accounts.manager.id]))
    expect((await agent.get('/api/session')).status).toBe(401)
    expect((await agent.get(`/api/farms/${other.id}/records`)).status).toBe(401)
    expect((await agent.post('/api/farms').send({})).status).toBe(401)
  })

  it('leaves the farm at the next request when the person is no longer active on it', async () => {
    const other = await house.makeFarm()
    const agent = await house.as(other.accounts.applicator)
    expect((await agent.get(`/api/farms/${other.id}/blocks`)).status).toBe(200)
    await house.services.database.inFarm({ farmId: other.id, seasons: null }, (manager) =>
      manager.query('UPDATE people SET active = false WHERE account_id = $1', [other.accounts.applicator.id]))
    expect((await agent.get(`/api/farms/${other.id}/blocks`)).status).toBe(404)
  })

  it('keeps cookies from scripts and from other sites', async () => {
    const response = await signIn(farm.accounts.owner.email, PASSWORD)
    const cookies = response.headers['set-cookie'] as unknown as string[]
    for (const cookie of cookies) {
      expect(cookie).toContain('HttpOnly')
      expect(cookie).toContain('SameSite=Lax')
    }
  })
})

describe('guessing', () => {
  it('B-122: is slowed by account and address; another address and a known device still get in', async () => {
    const guarded = await openHouse()
    const guardedFarm = await guarded.makeFarm()
    const { email } = guardedFarm.accounts.applicator
    const server = guarded.app.listen(0, '127.0.0.1')
    await once(server, 'listening')
    const { port } = server.address() as AddressInfo
    const from = (localAddress: string, password: string, cookie = '') => post({ port, localAddress, email, password, cookie })
    const known = await from('127.0.0.1', PASSWORD)
    const device = known.cookies.find((cookie) => cookie.startsWith('drenchleaf.device.')) ?? ''
    const guesses = []
    for (let guess = 0; guess < 7; guess += 1) guesses.push(await from('127.0.0.2', `guess number ${guess}`))
    expect(guesses.map(({ status }) => status)).toEqual([401, 401, 401, 401, 401, 429, 429])
    expect(guesses.at(-1)?.retryAfter).toBeGreaterThan(0)
    expect((await from('127.0.0.2', PASSWORD)).status).toBe(429)
    expect((await from('127.0.0.3', PASSWORD)).status).toBe(200)
    expect((await from('127.0.0.2', PASSWORD, device)).status).toBe(200)
    server.close()
    await guarded.close()
  })
})

describe('signing', () => {
  it('is stopped by nobody else’s guesses, and by ten wrong passwords of its own session', async () => {
    const guarded = await openHouse()
    const guardedFarm = await guarded.makeFarm()
    const worker = await guarded.as(guardedFarm.accounts.applicator)
    const { default: request } = await import('supertest')
    for (let guess = 0; guess < 25; guess += 1) {
      await request(guarded.app).post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email: `x${guess}@farm.example`, password: 'a guess' })
    }
    const address = `/api/farms/${guardedFarm.id}/records/01900000-0000-7000-8000-000000000001/sign`
    expect((await worker.post(address).send({ password: PASSWORD })).status).toBe(404)
    const wrong = []
    for (let slip = 0; slip < 11; slip += 1) wrong.push((await worker.post(address).send({ password: 'a slip' })).status)
    expect(wrong).toEqual([...Array<number>(10).fill(422), 429])
    await guarded.close()
  })
})

describe('unsafe requests', () => {
  it('need the header that only our pages send', async () => {
    const response = await supertest(house.app).post('/api/session').send({ email: farm.accounts.owner.email, password: PASSWORD })
    expect(response.status).toBe(403)
    expect(response.body.code).toBe('foreign_request')
  })

  it.each([
    { name: 'text announced as such', type: 'text/plain', body: '{}', status: 415 },
    { name: 'broken JSON', type: 'application/json', body: '{"email":', status: 400 },
    { name: 'a bare number', type: 'application/json', body: '5', status: 400 },
  ])('$name is $status', async ({ type, body, status }) => {
    const response = await supertest(house.app).post('/api/session').set('X-Requested-With', 'drenchleaf').set('Content-Type', type).send(body)
    expect(response.status).toBe(status)
    expect(response.type).toBe('application/problem+json')
  })

  it('answers in Spanish when asked', async () => {
    const response = await supertest(house.app).get('/api/session').set('Accept-Language', 'es')
    expect(response.body).toMatchObject({ status: 401, title: 'Primero abra su sesión.' })
  })

  it('have no delete for a record', async () => {
    const owner = await house.as(farm.accounts.owner)
    const response = await owner.delete(`/api/farms/${farm.id}/records/01900000-0000-7000-8000-000000000001`)
    expect(response.status).toBe(405)
    expect(response.headers['allow']).toBe('GET, PUT')
  })
})

interface Sent {
  status: number
  cookies: string[]
  retryAfter: number
}

/** A sign-in from a chosen address of this machine's loopback. */
function post({ port, localAddress, email, password, cookie }: { port: number; localAddress: string; email: string; password: string; cookie: string }): Promise<Sent> {
  return new Promise((resolve, reject) => {
    const request = httpRequest(
      {
        host: '127.0.0.1', port, path: '/api/session', method: 'POST', localAddress, agent: new HttpAgent({ keepAlive: false }),
        headers: { 'Content-Type': 'application/json', 'X-Requested-With': 'drenchleaf', Cookie: cookie.split(';')[0] ?? '' },
      },
      (response) => {
        response.resume()
        response.once('end', () => resolve({
          status: response.statusCode ?? 0,
          cookies: response.headers['set-cookie'] ?? [],
          retryAfter: Number(response.headers['retry-after'] ?? 0),
        }))
      },
    )
    request.once('error', reject)
    request.end(JSON.stringify({ email, password }))
  })
}
