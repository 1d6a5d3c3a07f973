import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { signRecord } from '../support/signRecord.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent
let certifier: Agent

beforeAll(async () => { house = await openHouse() })
afterAll(() => house.close())

async function fresh(): Promise<void> {
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
  certifier = await house.as(farm.accounts.certifier)
}
const patch = (body: object) => owner.patch(`/api/farms/${farm.id}`).send(body)
const journal = (action: string) => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
  manager.query<{ detail: Record<string, unknown> }[]>('SELECT detail FROM journal WHERE action = $1 ORDER BY at', [action]))

describe('the profile of a farm', () => {
  beforeAll(fresh)

  it('is changed part by part, under its revision, with what stood before in the journal', async () => {
    const { body: first } = await patch({ revision: 1, ruleSets: ['usOrganic'] }).expect(200)
    expect(first).toMatchObject({ certificates: [], ruleSets: ['usOrganic'], units: 'metric', contact: null, calibrationDays: 365, revision: 2 })
    const { body: second } = await patch({ revision: 2, name: 'Otherfield', units: 'us', contact: { person: 'Ada' } }).expect(200)
    expect(second).toMatchObject({ name: 'Otherfield', ruleSets: ['usOrganic'], contact: { person: 'Ada', address: null, phone: null, email: null }, revision: 3 })
    const { body: third } = await patch({ revision: 3, contact: null }).expect(200)
    expect(third).toMatchObject({ name: 'Otherfield', contact: null })
    const entries = await journal('farm.updated')
    expect(entries.map(({ detail }) => detail)).toMatchObject([{ before: { ruleSets: [] } }, { before: { units: 'metric', contact: null } }, { before: { contact: { person: 'Ada' } } }])
    const { body: seen } = await certifier.get(`/api/farms/${farm.id}`).expect(200)
    expect(seen).toEqual(third)
  })

  it('answers a stale change with the farm as it is', async () => {
    const { body } = await patch({ revision: 1, name: 'Late' }).expect(409)
    expect(body).toMatchObject({ code: 'stale', current: { name: 'Otherfield' } })
  })

  it.each([
    [{ zone: 'Mars/Olympus' }, 'zone', 'farm.zone'],
    [{ seasonStart: '02-30' }, 'seasonStart', 'date.invalid'],
    [{ calibrationDays: 0 }, 'calibrationDays', undefined],
    [{ home: [200, 10] }, 'home.0', undefined],
    [{ ruleSets: ['nobody'] }, 'ruleSets.0', undefined],
  ])('refuses %j', async (wrong, path, code) => {
    const { body } = await patch({ revision: 4, ...wrong }).expect(422)
    const [error] = (body as { errors: { path: string; code: string }[] }).errors
    expect(error?.path).toBe(path)
    if (code !== undefined) expect(error?.code).toBe(code)
  })
})

describe('zone and season of a farm with records', () => {
  beforeAll(async () => {
    await fresh()
    await signRecord(house, farm)
  })

  it('asks why the zone changes, and then leaves records as they are', async () => {
    const { body: before } = await owner.get(`/api/farms/${farm.id}/records`).expect(200)
    const { body: asked } = await patch({ revision: 1, zone: 'Europe/Madrid' }).expect(422)
    expect(asked).toMatchObject({ acknowledgeable: true, errors: [{ path: 'zone', code: 'farm.zone_change' }] })
    await patch({ revision: 1, zone: 'Europe/Madrid', acknowledged: [{ code: 'farm.zone_change', reason: 'Typed wrong at the start' }] }).expect(200)
    const { body: after } = await owner.get(`/api/farms/${farm.id}/records`).expect(200)
    const signed = ({ items }: { items: { digest: string; season: number; number: string }[] }) => items.map(({ digest, season, number }) => ({ digest, season, number }))
    expect(signed(after as never)).toEqual(signed(before as never))
  })

  it('keeps the season once it stands in a signed record', async () => {
    const { body } = await patch({ revision: 2, seasonStart: '07-01' }).expect(422)
    expect(body).toMatchObject({ errors: [{ path: 'seasonStart', code: 'farm.season_fixed' }] })
    await patch({ revision: 2, seasonStart: '03-01' }).expect(200)
  })
})

describe('the first hour', () => {
  beforeAll(fresh)

  it('is read off the farm, skipped and taken up again, and put away', async () => {
    const address = `/api/farms/${farm.id}/start`
    const states = (body: unknown) => Object.fromEntries((body as { steps: { step: string; state: string }[] }).steps.map(({ step, state }) => [step, state]))
    const { body: first } = await owner.get(address).expect(200)
    expect(states(first)).toEqual({ place: 'open', profile: 'open', block: 'open', material: 'open', record: 'open', person: 'done' })
    await patch({ revision: 1, home: [-123.31, 44.61] }).expect(200)
    await patch({ revision: 2, units: 'us' }).expect(200)
    const { body: second } = await owner.patch(address).send({ skipped: ['material', 'block', 'place'] }).expect(200)
    expect(states(second)).toMatchObject({ place: 'done', profile: 'done', block: 'skipped', material: 'skipped', record: 'open' })
    const { body: third } = await owner.patch(address).send({ skipped: [], away: true }).expect(200)
    expect(states(third)).toMatchObject({ block: 'open', material: 'open' })
    expect(third).toMatchObject({ away: true })
    await signRecord(house, farm)
    expect(states((await owner.get(address).expect(200)).body)).toMatchObject({ block: 'done', material: 'done', record: 'done' })
  })
})

describe('a practice farm', () => {
  it('is made once, marked, beside the own farms and not counted among them, and put away', async () => {
    await fresh()
    const id = uuidV7()
    const { body: made } = await owner.post('/api/practice-farm').send({ id }).expect(201)
    expect(made).toMatchObject({ id, practice: true, name: 'PRACTICE farm' })
    const { body: again } = await owner.post('/api/practice-farm').send({ id: uuidV7() }).expect(200)
    expect(again).toMatchObject({ id })
    const { body: records } = await owner.get(`/api/farms/${id}/records`).expect(200)
    expect((records as { items: { state: string }[] }).items.map(({ state }) => state).sort()).toEqual(['signed', 'signed', 'signed', 'signed', 'signed', 'started'])

    const room = house.services.config.farmsPerAccount
    for (let own = 1; own < room; own += 1) await owner.post('/api/farms').send({ id: uuidV7(), name: `F${own}`, zone: 'UTC', seasonStart: '01-01' }).expect(201)
    await owner.post('/api/farms').send({ id: uuidV7(), name: 'One more', zone: 'UTC', seasonStart: '01-01' }).expect(422)

    await owner.delete('/api/practice-farm').expect(204)
    await owner.get(`/api/farms/${id}`).expect(404)
    await owner.delete('/api/practice-farm').expect(404)
    const other = uuidV7()
    await owner.post('/api/practice-farm').send({ id: other }).expect(201)
    await owner.get(`/api/farms/${other}`).expect(200)
  }, 60_000)
})
