import supertest from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { recordStatements } from '../support/recordStatements.ts'
import { NOW, openHouse, PASSWORD, type TestFarm, type TestHouse } from '../support/openHouse.ts'

const NEW = 'another fine sentence here'

let house: TestHouse
let farm: TestFarm

beforeAll(async () => { house = await openHouse({ config: { publicUrl: 'https://register.example' } }) })
beforeEach(async () => {
  house.setNow(NOW)
  farm = await house.makeFarm()
})
afterAll(() => house.close())

const anybody = () => supertest.agent(house.app).set({ 'X-Requested-With': 'drenchleaf', 'X-Forwarded-Proto': 'https' })
let turn = 0
const ask = (email: string, from = `2001:db8::${(turn += 1)}`) => anybody().post('/api/reset').set('X-Forwarded-For', from).send({ email })
const linkTo = async (email: string): Promise<string> => /https:\/\/register\.example\/reset\/([\w-]+)/.exec((await house.mailTo(email)).find(({ text }) => text.includes('/reset/'))?.text ?? '')?.[1] ?? ''
const spend = (token: string, password = NEW) => anybody().post('/api/reset/password').send({ token, password })
const signIn = (email: string, password: string) => anybody().post('/api/session').send({ email, password })

describe('a forgotten password', () => {
  it('is renewed by a link to its e-mail: signed in nowhere, ended everywhere, and told of', async () => {
    const { email } = farm.accounts.manager
    const before = (await signIn(email, PASSWORD).expect(200)).headers['set-cookie'] as unknown as string[]
    await ask(email.toUpperCase()).expect(204)
    const token = await linkTo(email)
    expect((await anybody().get(`/api/reset/${token}`).expect(200)).body).toEqual({ email })
    const spent = await spend(token).expect(204)
    expect(String(spent.headers['set-cookie'])).not.toContain('sid')
    await anybody().get('/api/session').set('Cookie', before.map((cookie) => cookie.split(';')[0]).join('; ')).expect(401)
    await signIn(email, PASSWORD).expect(401)
    await signIn(email, NEW).expect(200)
    const told = (await house.mailTo(email)).find(({ subject }) => subject === 'Your password was changed')
    expect(told?.to).toEqual([email])
    expect(told?.text).toContain('16 June 2026 at 14:00 UTC')
  })

  it('B-120: has a link that works once, for half an hour, for its own account, and refuses in one text', async () => {
    const { email } = farm.accounts.owner
    await ask(email).expect(204)
    const token = await linkTo(email)
    await spend(token, 'short').expect(422)
    await spend(token).expect(204)
    const reused = await spend(token)
    await ask(email).expect(204)
    const late = await linkTo(email)
    house.setNow(new Date(Date.parse(NOW) + 31 * 60_000).toISOString())
    const expired = await spend(late)
    const unknown = await spend('x'.repeat(43))
    for (const answer of [reused, expired, unknown]) expect({ ...answer.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
    expect([reused.status, expired.status, unknown.status]).toEqual([400, 400, 400])
  })

  it('lets no link of another kind be spent for it, nor it for another', async () => {
    const { email } = farm.accounts.applicator
    await ask(email).expect(204)
    const token = await linkTo(email)
    expect((await anybody().get(`/api/welcome/${token}`)).status).toBe(400)
    expect((await anybody().post('/api/welcome').send({ token, name: 'X', password: NEW })).status).toBe(400)
    await spend(token).expect(204)
  })

  it('B-119: builds its link from the public address, whatever the request claims', async () => {
    const { email } = farm.accounts.certifier
    await ask(email).set({ Host: 'evil.example', 'X-Forwarded-Host': 'evil.example' }).expect(204)
    const [letter] = await house.mailTo(email)
    expect(`${letter?.text}${letter?.html}`).toContain('https://register.example/reset/')
    expect(`${letter?.text}${letter?.html}`).not.toContain('evil')
  })

  it('is answered alike where there is no such account, and writes to nobody there', async () => {
    const known = await ask(farm.accounts.owner.email)
    const unknown = await ask('nobody@nowhere.example')
    expect([known.status, unknown.status]).toEqual([204, 204])
    expect(unknown.text).toBe(known.text)
    expect(await house.mailTo('nobody@nowhere.example')).toEqual([])
    await ask('no mail').expect(422)
  })

  it('does the same work where there is no such account', async () => {
    house.setNow(new Date(Date.parse(NOW) + 7_200_000).toISOString())
    const asked = (email: string) => recordStatements(() => ask(email).expect(204))
    const [known, unknown] = [await asked(farm.accounts.owner.email), await asked('nobody@slow.example')]
    const texts = (list: typeof known) => list.map(({ text }) => text.replace(/^(RELEASE|ROLLBACK TO) SAVEPOINT/, 'END OF SAVEPOINT'))
    expect(texts(unknown)).toEqual(texts(known))
    expect(known.length).toBeGreaterThan(5)
  })

  it('is asked for five times an hour under one e-mail, known or not, and signing in goes on', async () => {
    for (const email of [farm.accounts.owner.email, `nobody-${farm.id}@farm.example`]) {
      for (let turn = 0; turn < 5; turn += 1) await ask(email).expect(204)
      expect((await ask(email)).body).toMatchObject({ status: 429, code: 'reset.too_many' })
    }
    await signIn(farm.accounts.owner.email, PASSWORD).expect(200)
    house.setNow(new Date(Date.parse(NOW) + 3_601_000).toISOString())
    expect((await ask(farm.accounts.owner.email)).status).toBe(204)
  })

  it('is asked for twenty times an hour from one address', async () => {
    for (let asked = 0; asked < 20; asked += 1) await ask(`nobody-${asked}-${farm.id}@farm.example`, '203.0.113.7').expect(204)
    expect((await ask(farm.accounts.owner.email, '203.0.113.7')).status).toBe(429)
    expect((await ask(farm.accounts.owner.email)).status).toBe(204)
  })

  it('is not of an account that was closed, or that never had one', async () => {
    const { email, id } = farm.accounts.manager
    await house.services.database.inHouse((manager) => manager.query('UPDATE accounts SET deactivated_at = now() WHERE id = $1', [id]))
    await ask(email).expect(204)
    expect(await house.mailTo(email)).toEqual([])
  })
})
