import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let owner: Agent
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  owner = await house.as(farm.accounts.owner)
  certifier = await house.as(farm.accounts.certifier)
})
afterAll(() => house.close())

const FIRST = { id: uuidV7(), number: 'C-17', body: 'Thornfield Review', scope: 'Apples', validFrom: '2026-02-01', validUntil: '2027-01-31' }
const at = (path = '') => `/api/farms/${farm.id}/certificates${path}`
const journal = () => house.services.database.inFarm({ farmId: farm.id, seasons: null }, (manager) =>
  manager.query<{ action: string; detail: object }[]>("SELECT action, detail FROM journal WHERE action LIKE 'certificate.%' ORDER BY at, id"))
const ofFarm = async (agent: Agent) => (await agent.get(`/api/farms/${farm.id}`).expect(200)).body.certificates as { number: string }[]

describe('certificates of a farm', () => {
  it('are written down once, renewed, corrected and taken back, each deed in the journal; a certifier reads them all', async () => {
    await owner.post(at()).send(FIRST).expect(201)
    const again = await owner.post(at()).send(FIRST).expect(200)
    expect(again.body).toMatchObject({ ...FIRST, withdrawn: null, revision: 1 })
    expect((await owner.post(at()).send({ ...FIRST, number: 'C-99' }).expect(422)).body.errors[0].code).toBe('idempotency.mismatch')

    const second = { ...FIRST, id: uuidV7(), number: 'C-18', validFrom: '2027-02-01', validUntil: null }
    await owner.post(at()).send(second).expect(201)
    const { id, ...fields } = second
    expect((await owner.patch(at(`/${id}`)).send({ revision: 1, ...fields, validUntil: '2028-01-31' }).expect(200)).body).toMatchObject({ validUntil: '2028-01-31', revision: 2 })
    expect((await owner.patch(at(`/${id}`)).send({ revision: 1, ...fields, number: 'C-20' }).expect(409)).body).toMatchObject({ code: 'stale', current: { validUntil: '2028-01-31', revision: 2 } })

    await owner.post(at(`/${id}/withdraw`)).send({ reason: 'Another farm’s' }).expect(200)
    await owner.post(at(`/${id}/withdraw`)).send({ reason: 'Another farm’s' }).expect(200)
    expect((await owner.post(at(`/${id}/withdraw`)).send({ reason: 'Else' }).expect(409)).body.code).toBe('certificate.withdrawn')
    expect((await owner.patch(at(`/${id}`)).send({ revision: 3, ...fields }).expect(409)).body.code).toBe('certificate.withdrawn')

    expect(await ofFarm(certifier)).toEqual(await ofFarm(owner))
    expect(await ofFarm(owner)).toMatchObject([{ number: 'C-17', withdrawn: null }, { number: 'C-18', withdrawn: { reason: 'Another farm’s' } }])
    expect((await journal()).map(({ action, detail }) => [action, detail])).toMatchObject([
      ['certificate.added', { number: 'C-17' }], ['certificate.added', { number: 'C-18' }],
      ['certificate.changed', { before: { validUntil: null }, after: { validUntil: '2028-01-31' } }], ['certificate.withdrawn', { reason: 'Another farm’s' }],
    ])
  })

  it.each([
    [{ validUntil: '2026-01-31' }, 'validUntil', 'farm.certificate_dates'], [{ number: ' ' }, 'number', 'text.required'], [{ validFrom: '2026-02-30' }, 'validFrom', 'date.invalid'],
  ])('refuse %j', async (wrong, path, code) => {
    expect((await owner.post(at()).send({ ...FIRST, id: uuidV7(), ...wrong }).expect(422)).body.errors[0]).toMatchObject({ path, code })
  })

  it('are of this farm alone', async () => {
    expect((await owner.patch(at(`/${uuidV7()}`)).send({ revision: 1, number: '1', body: 'B', validFrom: '2026-01-01' })).status).toBe(404)
    const other = await house.makeFarm()
    expect((await (await house.as(other.accounts.owner)).post(at(`/${FIRST.id}/withdraw`)).send({ reason: 'x' })).status).toBe(404)
  })
})
