import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildGround, buildSite } from '../../server/demo/buildThings.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { readText } from '../support/readPdf.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const address = (rest: string) => `/api/farms/${farm.id}${rest}`
const codes = (body: { errors?: { path: string; code: string }[] }) => (body.errors ?? []).map(({ path, code }) => `${path} ${code}`)
const line = (...coordinates: unknown[]) => ({ type: 'LineString', coordinates })

describe('a site to keep clear of', () => {
  it('is written down once, however often it is sent', async () => {
    const site = buildSite({ name: 'Yard well', keepClearM: '30', note: 'Drunk from' })
    const [one, two] = await Promise.all([manager.post(address('/sites')).send(site), manager.post(address('/sites')).send(site)])
    expect([one.status, two.status].sort()).toEqual([200, 201])
    expect(one.body).toEqual(two.body)
    expect(one.body).toMatchObject({ kind: 'well', keepClearM: '30', note: 'Drunk from', endedOn: null, revision: 1 })
    const other = await manager.post(address('/sites')).send({ ...site, keepClearM: '10' })
    expect([other.status, ...codes(other.body)]).toEqual([422, 'id idempotency.mismatch'])
  })

  it('is read by everybody of the farm and by the certifier, with its distance', async () => {
    for (const member of ['owner', 'applicator', 'certifier'] as const) {
      const { body } = await (await house.as(farm.accounts[member])).get(address('/sites')).expect(200)
      expect(body.items).toMatchObject([{ name: 'Yard well', keepClearM: '30' }])
    }
  })

  it('changes against the revision that was seen, and what stood before is in the journal', async () => {
    const { body: made } = await manager.post(address('/sites')).send(buildSite({ name: 'Hives', kind: 'hives', keepClearM: null })).expect(201)
    const { body } = await manager.patch(address(`/sites/${made.id}`)).send({ revision: 1, keepClearM: '18' }).expect(200)
    expect(body).toMatchObject({ keepClearM: '18', name: 'Hives', revision: 2 })
    const old = await manager.patch(address(`/sites/${made.id}`)).send({ revision: 1, keepClearM: '5' })
    expect([old.status, old.body.current?.keepClearM]).toEqual([409, '18'])
    const same = await manager.patch(address(`/sites/${made.id}`)).send({ revision: 2, name: 'Hives', geometry: made.geometry }).expect(200)
    expect(same.body.revision).toBe(2)
    const ended = await manager.patch(address(`/sites/${made.id}`)).send({ revision: 2, endedOn: '2026-06-16' }).expect(200)
    expect(ended.body).toMatchObject({ endedOn: '2026-06-16', revision: 3 })
    const entries: { action: string; detail: object }[] = await house.services.database.inFarm({ farmId: farm.id, seasons: null }, (tx) =>
      tx.query('SELECT action, detail FROM journal WHERE subject_id = $1 ORDER BY at, id', [made.id]))
    expect(entries).toEqual([
      { action: 'site.created', detail: { name: 'Hives', kind: 'hives', keepClearM: null } },
      { action: 'site.changed', detail: { name: 'Hives', before: { keepClearM: null } } },
      { action: 'site.changed', detail: { name: 'Hives', before: { endedOn: null } } },
    ])
  })

  it.each([
    { change: { keepClearM: '0' }, error: 'keepClearM number.above_zero' },
    { change: { keepClearM: '5000.1' }, error: 'keepClearM number.metres' },
    { change: { name: ' ' }, error: 'name text.required' },
    { change: { kind: 'castle' }, error: 'kind field.choice' },
    { change: { geometry: { type: 'Point', coordinates: [4, 91] } }, error: 'geometry geometry.out_of_range' },
    { change: { geometry: { type: 'Point', coordinates: [500_000, 4_900_000] } }, error: 'geometry geometry.degrees_needed' },
    { change: { geometry: { type: 'Point', coordinates: ['4', 5] } }, error: 'geometry geometry.coordinates' },
    { change: { geometry: line([4, 5], [4, 5, 9]) }, error: 'geometry geometry.line_short' },
    { change: { geometry: line([-179, 5], [179, 5]) }, error: 'geometry geometry.crosses_antimeridian' },
    { change: { geometry: line(...Array.from({ length: 5_001 }, (_, at) => [at / 1e5, 5])) }, error: 'geometry geometry.too_many_points' },
    { change: { geometry: { type: 'MultiPoint', coordinates: [[4, 5]] } }, error: 'geometry geometry.place_type' },
    { change: { geometry: { type: 'Polygon', coordinates: [[[0, 0], [0.01, 0.01], [0.01, 0], [0, 0.01], [0, 0]]] } }, error: 'geometry.coordinates.0 geometry.self_intersection' },
  ])('is refused with $error', async ({ change, error }) => {
    const response = await manager.post(address('/sites')).send({ ...buildSite(), ...change })
    expect([response.status, ...codes(response.body)]).toEqual([422, error])
    expect(response.body.errors[0].message).not.toContain('problems.')
  })
})

describe('the ground plan', () => {
  it('keeps lines flat, to 7 decimals and without repeated places', async () => {
    const { body } = await manager.post(address('/ground')).send(buildGround({ kind: 'track', name: 'Hollow Lane', widthM: '5.5', geometry: line([4.12345678, 44, 210], [4.12345678, 44], [4.2, 44.1]) })).expect(201)
    expect(body).toMatchObject({ name: 'Hollow Lane', widthM: '5.5', geometry: line([4.1234568, 44], [4.2, 44.1]) })
    const nameless = await manager.patch(address(`/ground/${body.id}`)).send({ revision: 1, name: null }).expect(200)
    expect(nameless.body.name).toBeNull()
    const { body: list } = await manager.get(address('/ground?limit=1')).expect(200)
    expect(list).toMatchObject({ items: [{ name: null }], next: null })
  })

  it.each([
    { change: { kind: 'building' }, error: 'geometry ground.needs_outline' },
    { change: { kind: 'hedge', geometry: { type: 'Point', coordinates: [4, 5] } }, error: 'geometry ground.needs_line' },
    { change: { kind: 'other', geometry: { type: 'Point', coordinates: [4, 5] }, widthM: '2' }, error: 'widthM ground.width_of_line' },
  ] as const)('refuses with $error', async ({ change, error }) => {
    const response = await manager.post(address('/ground')).send({ ...buildGround(), ...change })
    expect([response.status, ...codes(response.body)]).toEqual([422, error])
  })

  it('is held to its kind when it changes', async () => {
    const { body } = await manager.post(address('/ground')).send(buildGround({ widthM: '2' })).expect(201)
    const response = await manager.patch(address(`/ground/${body.id}`)).send({ revision: 1, kind: 'building' })
    expect([response.status, ...codes(response.body)]).toEqual([422, 'geometry ground.needs_outline'])
  })
})

describe('the printed map', () => {
  it('is open to everybody of the farm and to the certifier, on each paper, and shows what is there today', async () => {
    const gone = await manager.post(address('/sites')).send(buildSite({ name: 'Filled-in well', endedOn: '2026-06-16' })).expect(201)
    expect(gone.body.endedOn).toBe('2026-06-16')
    for (const [member, paper] of [['applicator', 'a4'], ['certifier', 'letter']] as const) {
      const agent = await house.as(farm.accounts[member])
      const { body } = await agent.get(address(`/reports/farm-map?paper=${paper}`)).expect(200).expect('Content-Type', 'application/pdf')
      const text = readText(Buffer.from(body as Uint8Array))
      expect(text).toContain('Yard well, 30 m')
      expect(text).not.toContain('Filled-in well')
    }
    await manager.get(address('/reports/farm-map?paper=a0')).expect(422)
  })
})
