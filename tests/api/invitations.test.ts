import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let other: TestFarm
let owner: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  other = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
})
beforeEach(() => house.setNow(NOW))
afterAll(() => house.close())

let turn = 0
const buildInvitation = (changes: object = {}) => ({ id: uuidV7(), email: `new-${(turn += 1)}@farm.example`, name: 'Nia', role: 'applicator', language: 'en', ...changes })
const invite = (body: object) => owner.post(`/api/farms/${farm.id}/invitations`).send(body)
const open = async () => (await owner.get(`/api/farms/${farm.id}/invitations`).expect(200)).body.items as { id: string; email: string; revision: number; letter: string; isLate: boolean }[]
const linkTo = async (email: string): Promise<string> => /\/welcome\/([\w-]+)/.exec((await house.mailTo(email)).find(({ text }) => text.includes('/welcome/'))?.text ?? '')?.[1] ?? ''
const anybody = () => supertest.agent(house.app).set('X-Requested-With', 'drenchleaf')
const later = (hours: number) => house.setNow(new Date(Date.parse(NOW) + hours * 3_600_000).toISOString())

describe('an invitation', () => {
  it('brings somebody new onto the farm with a name and a password of their own, in the role of the letter', async () => {
    const body = buildInvitation({ language: 'es', email: ' Nueva@Farm.Example ' })
    const { body: made } = await invite(body).expect(201)
    expect(made).toMatchObject({ email: 'nueva@farm.example', role: 'applicator', isLate: false, letter: 'waiting' })
    await invite(body).expect(200)
    await invite({ ...body, role: 'manager', password: PASSWORD }).expect(422)
    const token = await linkTo('nueva@farm.example')
    expect(token).toMatch(/^[\w-]{43}$/)
    expect((await open()).find(({ id }) => id === body.id)).toMatchObject({ letter: 'sent' })
    const [letter] = await house.mailTo('nueva@farm.example')
    expect(letter).toMatchObject({ language: 'es', replyTo: farm.accounts.owner.email })
    const { body: read } = await anybody().get(`/api/welcome/${token}`).expect(200)
    expect(read).toMatchObject({ email: 'nueva@farm.example', needsPassword: true, invitation: { farmId: farm.id, role: 'applicator', language: 'es' } })
    await anybody().post('/api/welcome').send({ token, name: 'Nueva Pérez', password: 'hojas mojadas al alba' }).expect(204)
    const signedIn = await anybody().post('/api/session').send({ email: 'nueva@farm.example', password: 'hojas mojadas al alba' }).expect(200)
    expect(signedIn.body).toMatchObject({ user: { name: 'Nueva Pérez', language: 'es' }, memberships: [{ farmId: farm.id, role: 'applicator' }] })
    expect((await open()).map(({ id }) => id)).not.toContain(body.id)
    await anybody().post('/api/welcome').send({ token, name: 'Again', password: 'another one of these' }).expect(400)
  })

  it('is taken by who has an account with that account alone, and leaves its password and other farms as they are', async () => {
    const { email } = other.accounts.manager
    await invite(buildInvitation({ email, role: 'manager', password: PASSWORD })).expect(201)
    const token = await linkTo(email)
    expect((await anybody().get(`/api/welcome/${token}`)).body).toMatchObject({ needsPassword: false })
    const refused = await anybody().post('/api/welcome').send({ token, name: 'X', password: 'hojas mojadas al alba' })
    expect(refused.body).toMatchObject({ status: 409, code: 'welcome.has_account' })
    await anybody().post('/api/welcome/accept').send({ token }).expect(401)
    const stranger = await house.as(other.accounts.applicator)
    expect((await stranger.post('/api/welcome/accept').send({ token })).body).toMatchObject({ status: 409, code: 'welcome.other_account' })
    const invited = await house.as(other.accounts.manager)
    expect((await invited.post('/api/welcome/accept').send({ token }).expect(200)).body).toEqual({ farmId: farm.id })
    const { body } = await invited.get('/api/session').expect(200)
    expect(body.memberships).toHaveLength(2)
    expect(body.memberships).toContainEqual(expect.objectContaining({ farmId: farm.id, role: 'manager' }))
    await invited.post('/api/welcome/accept').send({ token }).expect(400)
  })

  it('lets somebody who was let go come back as who they were, in the new role', async () => {
    const gone = await house.makeFarm()
    const ownerOfGone = await house.as(gone.accounts.owner)
    await house.services.database.inFarm({ farmId: gone.id, seasons: null }, (manager) => manager.query('UPDATE people SET active = false WHERE id = $1', [gone.personIds.applicator]))
    await ownerOfGone.post(`/api/farms/${gone.id}/invitations`).send(buildInvitation({ email: gone.accounts.applicator.email, role: 'manager', password: PASSWORD })).expect(201)
    const token = await linkTo(gone.accounts.applicator.email)
    const back = await house.as(gone.accounts.applicator)
    await back.post('/api/welcome/accept').send({ token }).expect(200)
    expect((await back.get('/api/session')).body.memberships).toMatchObject([{ farmId: gone.id, role: 'manager', personId: gone.personIds.applicator }])
  })

  it('is written down: who asked whom as what, and who came', async () => {
    const actions = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
      manager.query("SELECT action, person_id IS NOT NULL AS known FROM journal WHERE action LIKE 'invitation.%' ORDER BY at, id"))
    expect(actions).toContainEqual({ action: 'invitation.sent', known: true })
    expect(actions).toContainEqual({ action: 'invitation.taken', known: true })
  })
})

describe('inviting', () => {
  it('asks the inviter’s password where the role leads the farm', async () => {
    expect((await invite(buildInvitation({ role: 'owner' }))).body).toMatchObject({ status: 422, errors: [{ path: 'password', code: 'session.wrong_password' }] })
    await invite(buildInvitation({ role: 'owner', password: 'not it' })).expect(422)
    expect((await invite(buildInvitation({ role: 'owner', password: PASSWORD }))).status).toBe(201)
  })

  it('refuses who works here already, and a second letter to who was asked', async () => {
    expect((await invite(buildInvitation({ email: farm.accounts.applicator.email }))).body.errors).toMatchObject([{ path: 'email', code: 'invitation.on_farm' }])
    const first = buildInvitation()
    await invite(first).expect(201)
    expect((await invite({ ...first, id: uuidV7() })).body).toMatchObject({ status: 409, errors: [{ path: 'email', code: 'invitation.open' }] })
    expect(await house.mailTo(first.email)).toHaveLength(1)
  })

  it.each(['', 'nobody', 'a@b.example, c@d.example', 'A <a@b.example>', 'a@b.example\r\nBcc: c@d.example', 'a@b', `${'a'.repeat(250)}@b.example`])('refuses %j as an e-mail', async (email) => {
    expect((await invite(buildInvitation({ email }))).status).toBe(422)
  })

  it('ends after forty letters a day, and goes on the next', async () => {
    const busy = await house.makeFarm()
    const agent = await house.as(busy.accounts.owner)
    const send = () => agent.post(`/api/farms/${busy.id}/invitations`).send(buildInvitation())
    for (let letter = 0; letter < 40; letter += 1) await send().expect(201)
    expect((await send()).body).toMatchObject({ status: 429, code: 'invitation.too_many' })
    later(24.1)
    await send().expect(201)
  })
})

describe('a link', () => {
  it('runs out after three days; sent again it works anew, and the one before no more', async () => {
    const body = buildInvitation()
    await invite(body).expect(201)
    const first = await linkTo(body.email)
    later(71)
    await anybody().get(`/api/welcome/${first}`).expect(200)
    later(73)
    await anybody().get(`/api/welcome/${first}`).expect(400)
    expect((await open()).find(({ id }) => id === body.id)).toMatchObject({ isLate: true, revision: 1 })
    const again = (revision: number) => owner.post(`/api/farms/${farm.id}/invitations/${body.id}/resend`).send({ revision })
    expect((await again(1).expect(200)).body).toMatchObject({ isLate: false, revision: 2 })
    expect((await again(1)).status).toBe(409)
    const second = await linkTo(body.email)
    expect(second).not.toBe(first)
    await again(2).expect(200)
    await anybody().get(`/api/welcome/${second}`).expect(400)
    await anybody().get(`/api/welcome/${await linkTo(body.email)}`).expect(200)
  })

  it('that was taken back opens nothing', async () => {
    const body = buildInvitation()
    await invite(body).expect(201)
    const token = await linkTo(body.email)
    await owner.post(`/api/farms/${farm.id}/invitations/${body.id}/withdraw`).send({ revision: 1 }).expect(200)
    const spent = await anybody().post('/api/welcome').send({ token, name: 'Nia', password: 'hojas mojadas al alba' })
    const unknown = await anybody().post('/api/welcome').send({ token: 'x'.repeat(43), name: 'Nia', password: 'hojas mojadas al alba' })
    expect(spent.status).toBe(400)
    expect({ ...spent.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
    expect((await open()).map(({ id }) => id)).not.toContain(body.id)
    await invite({ ...body, id: uuidV7() }).expect(201)
  })

  it('is spent once, by whoever is first of ten', async () => {
    const body = buildInvitation()
    await invite(body).expect(201)
    const token = await linkTo(body.email)
    const answers = await Promise.all(Array.from({ length: 10 }, (_none, place) => anybody().post('/api/welcome').send({ token, name: `N${place}`, password: `hojas mojadas al alba ${place}` })))
    expect(answers.map(({ status }) => status).sort()).toEqual([204, ...Array<number>(9).fill(400)])
  })
})

describe('the farm’s mail', () => {
  it('shows its owner each letter and how far it got, and repeats none with a link in it', async () => {
    const { body } = await owner.get(`/api/farms/${farm.id}/letters?limit=2`).expect(200)
    expect(body.items).toHaveLength(2)
    expect(JSON.stringify(body)).not.toContain('token')
    const sent = (await owner.get(`/api/farms/${farm.id}/letters?limit=200`).expect(200)).body.items.find(({ state }: { state: string }) => state === 'sent')
    expect(sent).toMatchObject({ kind: 'invitation', tries: 1, fault: null, canResend: false })
    expect((await owner.post(`/api/farms/${farm.id}/letters/${sent.id}/resend`).send({ id: uuidV7() })).body).toMatchObject({ status: 409, code: 'letter.secret' })
    const next = await owner.get(`/api/farms/${farm.id}/letters?limit=2&cursor=${encodeURIComponent(body.next)}`).expect(200)
    expect(next.body.items[0].id).not.toBe(body.items[1].id)
  })
})

describe('an e-mail that is known here and one that is not', () => {
  it('are answered alike to who invites them', async () => {
    const known = await invite(buildInvitation({ email: other.accounts.owner.email }))
    const unknown = await invite(buildInvitation())
    const shape = (body: Record<string, unknown>) => ({ ...body, id: '', email: '' })
    expect(known.status).toBe(201)
    expect(shape(known.body)).toEqual(shape(unknown.body))
  })
})
