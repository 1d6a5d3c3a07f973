import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())
beforeEach(async () => {
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
})

const people = (rest = '') => `/api/farms/${farm.id}/people${rest}`
const change = (id: string, body: object) => owner.patch(people(`/${id}`)).send({ revision: 1, password: PASSWORD, ...body })
const journal = () => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
  manager.query<{ action: string }[]>('SELECT action FROM journal ORDER BY at, id')).then((rows) => rows.map(({ action }) => action))

describe('a role', () => {
  it('changes with the owner’s password, and the next request goes by the new one', async () => {
    const manager = await house.as(farm.accounts.manager)
    const sprayer = { id: uuidV7(), code: 'Q1', name: 'Drencher', tankL: '400' }
    await change(farm.personIds.manager, { role: 'applicator', password: 'not the password' }).expect(422)
    const { body } = await change(farm.personIds.manager, { role: 'applicator' }).expect(200)
    expect(body).toMatchObject({ role: 'applicator', revision: 2, signsWith: 'password' })
    await manager.post(`/api/farms/${farm.id}/sprayers`).send(sprayer).expect(403)
    expect(await journal()).toContain('person.role_changed')
  })

  it('is not written over a change that the owner has not seen', async () => {
    await change(farm.personIds.manager, { name: 'Someone Else' }).expect(200)
    const { status, body } = await change(farm.personIds.manager, { role: 'applicator' })
    expect(status).toBe(409)
    expect(body.current).toMatchObject({ name: 'Someone Else', revision: 2 })
  })

  it('takes no word that is none: 422', async () => {
    expect((await change(farm.personIds.manager, { role: 'certifier' })).status).toBe(422)
  })
})

describe('the last owner', () => {
  it('can neither go nor take another role', async () => {
    for (const body of [{ role: 'manager' }, { active: false }]) {
      const answer = await change(farm.personIds.owner, body)
      expect(answer.status).toBe(422)
      expect(answer.body.errors).toMatchObject([{ path: 'role', code: 'person.last_owner' }])
    }
  })

  it('can once another owner is there, even in one moment with them: one owner stays', async () => {
    await change(farm.personIds.manager, { role: 'owner' }).expect(200)
    const other = await house.as(farm.accounts.manager)
    const [mine, theirs] = await Promise.all([
      owner.patch(people(`/${farm.personIds.manager}`)).send({ revision: 2, role: 'manager', password: PASSWORD }),
      other.patch(people(`/${farm.personIds.owner}`)).send({ revision: 1, role: 'manager', password: PASSWORD }),
    ])
    expect([mine.status, theirs.status].filter((status) => status === 200)).toHaveLength(1)
    expect([mine.status, theirs.status].filter((status) => [403, 422].includes(status))).toHaveLength(1)
  })
})

describe('letting somebody go', () => {
  it('refuses the session that is open at its next request, and a new one opens no farm', async () => {
    const worker = await house.as(farm.accounts.applicator)
    await worker.get(people()).expect(200)
    await change(farm.personIds.applicator, { active: false }).expect(200)
    await worker.get(people()).expect(401)
    const again = await house.as(farm.accounts.applicator)
    expect((await again.get('/api/session').expect(200)).body.memberships).toEqual([])
    await again.get(people()).expect(404)
    await owner.patch(people(`/${farm.personIds.applicator}`)).send({ revision: 2, active: true, password: PASSWORD }).expect(200)
    await again.get(people()).expect(200)
    expect(await journal()).toEqual(expect.arrayContaining(['person.let_go', 'person.taken_back']))
  })

  it('leaves the session of who works on another farm too, and that farm open', async () => {
    const other = await house.makeFarm()
    await house.services.database.inFarm({ farmId: other.id, seasons: null }, (manager) =>
      manager.query('UPDATE people SET account_id = $1 WHERE id = $2', [farm.accounts.applicator.id, other.personIds.applicator]))
    const worker = await house.as(farm.accounts.applicator)
    await change(farm.personIds.applicator, { active: false }).expect(200)
    expect((await worker.get(people())).status).toBe(404)
    expect((await worker.get(`/api/farms/${other.id}/people`)).status).toBe(200)
  })
})

describe('somebody without e-mail', () => {
  const add = (body: object) => owner.post(people()).send({ id: uuidV7(), name: 'Wick Ansel', pin: '481902', password: PASSWORD, ...body })

  it('is taken in once, with a PIN that nobody reads again', async () => {
    const id = uuidV7()
    const { body } = await add({ id }).expect(201)
    expect(body).toMatchObject({ id, role: 'applicator', email: null, signsWith: 'pin' })
    expect(JSON.stringify(body)).not.toContain('481902')
    expect((await add({ id }).expect(200)).body).toMatchObject({ id, signsWith: 'pin' })
    await add({ id, name: 'Another' }).expect(422)
  })

  it.each(['000000', '123456', '987654', '890123', '121212', '123123', '707070'])('gets no PIN that anybody tries first: %s', async (pin) => {
    expect((await add({ pin }).expect(422)).body.errors).toMatchObject([{ path: 'pin', code: 'pin.trivial' }])
  })

  it.each(['12345', '1234567', '12a456', ''])('gets six figures: not %j', async (pin) => {
    expect((await add({ pin }).expect(422)).body.errors).toMatchObject([{ path: 'pin', code: 'pin.format' }])
  })

  it('leads no farm, and has no PIN beside a password', async () => {
    const { body } = await add({}).expect(201)
    expect((await change(body.id as string, { role: 'manager' }).expect(422)).body.errors).toMatchObject([{ code: 'pin.role' }])
    const pin = await owner.put(people(`/${farm.personIds.applicator}/pin`)).send({ revision: 1, pin: '481902', password: PASSWORD })
    expect(pin.body.errors).toMatchObject([{ code: 'pin.has_email' }])
  })
})

describe('what was done to people', () => {
  it('stands in the journal with whom it was done to, as they are called now, and from what to what', async () => {
    await change(farm.personIds.manager, { role: 'applicator' }).expect(200)
    await change(farm.personIds.manager, { revision: 2, name: 'Tessaly Orr' }).expect(200)
    await change(farm.personIds.applicator, { active: false }).expect(200)
    const { body } = await owner.get(`/api/farms/${farm.id}/journal?kind=person`).expect(200)
    const entries = (body.items as { action: string; subject: string; facts: object[] }[]).map(({ action, subject, facts }) => ({ action, subject, facts }))
    expect(entries).toEqual([
      { action: 'person.let_go', subject: expect.stringContaining('applicator'), facts: [] },
      { action: 'person.renamed', subject: 'Tessaly Orr', facts: [] },
      { action: 'person.role_changed', subject: 'Tessaly Orr', facts: [{ name: 'roleFrom', value: 'manager' }, { name: 'roleTo', value: 'applicator' }] },
    ])
    const csv = await owner.get(`/api/farms/${farm.id}/journal/csv?kind=person`).expect(200)
    expect(csv.text).toContain('from Manager; to Applicator')
  })
})

describe('a lost phone', () => {
  it('is answered by ending every session of its owner', async () => {
    const [first, second] = [await house.as(farm.accounts.manager), await house.as(farm.accounts.manager)]
    await owner.post(people(`/${farm.personIds.manager}/end-sessions`)).send({ password: PASSWORD }).expect(204)
    for (const agent of [first, second]) expect((await agent.get('/api/session')).status).toBe(401)
    expect((await owner.get('/api/session')).status).toBe(200)
  })
})
