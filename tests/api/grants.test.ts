import { PassThrough } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { parse } from 'csv-parse/sync'
import supertest from 'supertest'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { buildRecord } from '../../server/demo/buildThings.ts'
import { NOW, openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let things: SeededThings
let owner: Agent
let certifier: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm({ seasons: [2026], endsOn: '2026-12-31' })
  things = await seedThings(house, farm)
  owner = await house.as(farm.accounts.owner)
  certifier = await house.as(farm.accounts.certifier)
  await sign(buildRecord(things))
  await sign(buildRecord({ ...things, startedAt: '2026-02-20T13:00:00Z', endedAt: '2026-02-20T14:00:00Z' }))
})
afterEach(() => house.setNow(NOW))
afterAll(() => house.close())

async function sign(input: ReturnType<typeof buildRecord>): Promise<string> {
  await owner.post(`/api/farms/${farm.id}/records`).send(input).expect(201)
  await owner.post(`/api/farms/${farm.id}/records/${input.id}/sign`).send({ password: PASSWORD, acknowledged: [{ code: 'record.late', reason: 'Found in the notebook.' }] }).expect(200)
  return input.id
}

const at = (path: string, farmId = farm.id) => `/api/farms/${farmId}${path}`
const give = (changes: object = {}) => ({ id: uuidV7(), certifierEmail: farm.accounts.certifier.email, organisation: 'Oaklode Review', seasons: [2026], endsOn: '2027-01-31', password: PASSWORD, ...changes })
const journalOf = async (query: object) => (await owner.get(at('/journal')).query(query).expect(200)).body.items as { action: string; subject: string | null; by: { name: string } | null; isOutsider: boolean; facts: { name: string; value: string }[] }[]
const ownGrant = async () => (await owner.get(at('/grants')).expect(200)).body.items[0] as { id: string; revision: number; lastTaken: { season: number; seq: number } | null }

describe('giving a grant', () => {
  it('opens the seasons to the e-mail once, however often it is sent, and asks the password', async () => {
    const other = await house.makeFarm()
    const body = give({ certifierEmail: other.accounts.certifier.email, seasons: [2026, 2025, 2026] })
    const wrong = await owner.post(at('/grants')).send({ ...body, password: 'another one, long' }).expect(422)
    expect(wrong.body.code).toBe('session.wrong_password')
    const made = await owner.post(at('/grants')).send(body).expect(201)
    expect(made.body).toMatchObject({ email: other.accounts.certifier.email, organisation: 'Oaklode Review', seasons: [2025, 2026], endsOn: '2027-01-31', stands: true, givenBy: expect.stringContaining('owner') })
    const again = await owner.post(at('/grants')).send(body).expect(200)
    expect(again.body).toEqual(made.body)
    await owner.post(at('/grants')).send({ ...body, endsOn: '2027-02-01' }).expect(422)
    const reader = await house.as(other.accounts.certifier)
    expect((await reader.get(at('/seasons')).expect(200)).body.items.map(({ season }: { season: number }) => season)).toEqual([2026, 2025])
    expect(await journalOf({ kind: 'grant' })).toMatchObject([{ action: 'grant.given', subject: 'Oaklode Review', facts: [{ name: 'seasons', value: '2025, 2026' }, { name: 'endsOn', value: '2027-01-31' }] }])
  })

  it('tells who has an account where to read, and invites who has none, once', async () => {
    const known = (await house.makeFarm()).accounts.certifier
    await owner.post(at('/grants')).send(give({ certifierEmail: known.email })).expect(201)
    const [told] = await house.mailTo(known.email)
    expect(told?.subject).toContain('season 2026')
    expect(told?.text).toContain('/farms')
    const email = `reviewer-${uuidV7()}@review.example`
    const body = give({ certifierEmail: email })
    await owner.post(at('/grants')).send(body).expect(201)
    await owner.post(at('/grants')).send(body).expect(200)
    const letters = await house.mailTo(email)
    expect(letters).toHaveLength(1)
    const token = /\/welcome\/([\w-]+)/.exec(letters[0]?.text ?? '')?.[1]
    const fresh = supertest.agent(house.app)
    const welcome = async (): Promise<unknown> => (await fresh.get(`/api/welcome/${token}`).expect(200)).body
    expect(await welcome()).toEqual({ email, needsPassword: true, invitation: null, grant: { farm: expect.stringMatching(/^Farm /), seasons: [2026], endsOn: '2027-01-31' } })
    await fresh.post('/api/welcome').set('X-Requested-With', 'drenchleaf').send({ token, name: 'Mirel Achter', password: PASSWORD }).expect(204)
    await fresh.post('/api/session').set('X-Requested-With', 'drenchleaf').send({ email, password: PASSWORD }).expect(200)
    expect((await fresh.get('/api/my-farms').expect(200)).body.items).toMatchObject([{ farmId: farm.id, season: 2026, grantedTo: '2027-01-31' }])
    expect((await fresh.get(at('/journal'))).status).toBe(403)
  })

  it.each([
    ['a day that is over', { endsOn: '2026-06-15' }, 'endsOn', 'grant.past'],
    ['a day too far ahead', { endsOn: '2032-01-01' }, 'endsOn', 'grant.too_long'],
    ['no season', { seasons: [] }, 'seasons', 'grant.no_season'],
    ['no e-mail', { certifierEmail: 'nobody' }, 'certifierEmail', 'grant.email'],
    ['a line break in the name', { organisation: 'Oaklode\nBcc: all@farm.example' }, 'organisation', 'text.line_break'],
  ])('refuses %s', async (_what, changes, path, code) => {
    const { body } = await owner.post(at('/grants')).send(give(changes)).expect(422)
    expect(body.errors).toMatchObject([{ path, code }])
  })

  it('refuses somebody who works on the farm', async () => {
    const { body } = await owner.post(at('/grants')).send(give({ certifierEmail: farm.accounts.manager.email.toUpperCase() })).expect(422)
    expect(body.errors).toMatchObject([{ path: 'certifierEmail', code: 'grant.own_person' }])
  })
})

describe('what a grant opens', () => {
  it('is its seasons in every report, and nothing of others', async () => {
    const pdf = await certifier.get(at('/seasons/2026/pdf')).buffer(true).expect(200).expect('Content-Type', 'application/pdf')
    expect((pdf.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-')
    const csv = await certifier.get(at('/seasons/2026/csv')).query({ language: 'en' }).expect(200)
    const rows = parse(csv.text, { bom: true, columns: true }) as Record<string, string>[]
    expect(rows.map((row) => row['Season'])).toEqual(['2026'])
    const sheets = await certifier.get(at('/seasons/2026/sheets')).buffer(true).expect(200)
    expect((sheets.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-')
    expect((await certifier.get(at('/seasons/2026/volumes')).expect(200)).body).toEqual({ records: 1, report: { volumes: 1 }, sheets: { volumes: 1 } })
    for (const what of ['pdf', 'csv', 'sheets', 'volumes']) {
      const closed = await certifier.get(at(`/seasons/2025/${what}`)).expect(404)
      const unknown = await certifier.get(at(`/seasons/2025/${what}`, '00000000-0000-7000-8000-000000000000')).expect(404)
      expect({ ...closed.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' })
    }
  })

  it('gives the farm and its certifier the same bytes', async () => {
    const [one, two] = [await certifier.get(at('/seasons/2026/pdf')).buffer(true), await owner.get(at('/seasons/2026/pdf')).buffer(true)]
    expect((one.body as Buffer).equals(two.body as Buffer)).toBe(true)
  })

  it('stands in the journal when it was taken away: who, what, which season', async () => {
    await certifier.get(at('/seasons/2026/csv')).expect(200)
    const [entry] = await journalOf({ kind: 'report' })
    expect(entry).toMatchObject({ action: 'report.downloaded', isOutsider: true, by: { name: expect.stringContaining('certifier') }, facts: [{ name: 'season', value: '2026' }, { name: 'format', value: 'csv' }] })
    expect((await ownGrant()).lastTaken).toMatchObject({ season: 2026, seq: 1 })
  })

  it('lists farm by season with the head that was taken, and says when the log is no longer what it was', async () => {
    await certifier.get(at('/seasons/2026/csv')).expect(200)
    const before = (await certifier.get('/api/my-farms').expect(200)).body.items
    expect(before).toMatchObject([{ farmId: farm.id, season: 2026, records: 1, withdrawn: 0, grantedTo: '2026-12-31', head: { seq: 1, agrees: true } }])
    const { default: pg } = await import('pg')
    const client = new pg.Client({ connectionString: house.ownerUrl })
    await client.connect()
    const alter = async (from: string, to: string) => {
      await client.query('BEGIN')
      await client.query("SELECT set_config('app.farm_id', $1, true)", [farm.id])
      await client.query('ALTER TABLE record_versions DISABLE TRIGGER record_versions_rows_stand')
      const { rowCount } = await client.query('UPDATE record_versions SET canonical_text = replace(canonical_text, $1, $2) WHERE season = 2026', [from, to])
      await client.query('ALTER TABLE record_versions ENABLE ALWAYS TRIGGER record_versions_rows_stand')
      await client.query('COMMIT')
      expect(rowCount).toBe(1)
    }
    const onPaper = async () => (await supertest(house.app).get(`/api/check/${before[0].head.checkCode}`).expect(200)).body
    expect(await onPaper()).toMatchObject({ found: true, number: null, season: { season: 2026, seq: 1, agrees: true, wentOn: false } })
    await alter('"schemaVersion"', '"schemaVersiom"')
    expect(await onPaper()).toMatchObject({ found: false, season: { agrees: false } })
    const after = (await certifier.get('/api/my-farms').expect(200)).body.items
    await alter('"schemaVersiom"', '"schemaVersion"')
    await client.end()
    expect(after).toMatchObject([{ head: { seq: 1, agrees: false } }])
    const outsider = await house.makeFarm()
    expect((await (await house.as(outsider.accounts.owner)).get('/api/my-farms').expect(200)).body).toEqual({ items: [], ended: [] })
  })
})

describe('what the owner sees of it', () => {
  it('is row by row and figure by figure what the certifier is answered, and a look in the journal', async () => {
    await owner.post(at('/records')).send(buildRecord(things)).expect(201)
    const { id } = await ownGrant()
    const ask = async (reader: Agent, path: string, query: object = {}) => (await reader.get(at(path)).query(query).expect(200)).body as { items: { season: number }[]; records: number; found: number }
    const own = await ask(owner, '/records')
    for (const query of [{}, { sort: 'number' }, { season: 2025 }, { state: 'draft' }]) {
      const seen = await ask(owner, `/grants/${id}/records`, query)
      expect(seen).toEqual(await ask(certifier, '/records', query))
      expect(seen.items.length).toBeLessThan(own.items.length)
    }
    expect((await ask(owner, `/grants/${id}/records`)).items.map(({ season }) => season)).toEqual([2026])
    expect(await ask(owner, `/grants/${id}/totals`)).toEqual(await ask(certifier, '/register/totals'))
    expect((await ask(owner, `/grants/${id}/totals`)).found).toBeLessThan((await ask(owner, '/register/totals')).found)
    const looks = async () => (await journalOf({ subject: id })).filter(({ action }) => action === 'grant.viewed')
    expect(await looks()).toMatchObject([{ isOutsider: false, by: { name: expect.stringContaining('owner') }, facts: [{ name: 'seasons', value: '2026' }] }])
    house.setNow('2026-06-16T23:00:00Z')
    await ask(owner, `/grants/${id}/records`)
    expect(await looks()).toHaveLength(2)
  })

  it('is nothing once the grant opens nothing, and not for who leads the season', async () => {
    const other = await house.makeFarm()
    const { body: grant } = await owner.post(at('/grants')).send(give({ certifierEmail: other.accounts.certifier.email })).expect(201)
    const manager = await house.as(farm.accounts.manager)
    expect((await manager.get(at(`/grants/${grant.id}/records`))).status).toBe(403)
    expect((await (await house.as(other.accounts.owner)).get(at(`/grants/${grant.id}/records`))).status).toBe(404)
    expect((await owner.get(at(`/grants/${uuidV7()}/records`))).status).toBe(404)
    await owner.post(at(`/grants/${grant.id}/end`)).send({ revision: grant.revision, password: PASSWORD }).expect(200)
    expect((await owner.get(at(`/grants/${grant.id}/records`)).expect(409)).body.code).toBe('grant.ended')
  })
})

describe('the end of a grant', () => {
  it('acts on the next request, and what was drawn before it is not delivered', async () => {
    const other = await house.makeFarm()
    const { body: grant } = await owner.post(at('/grants')).send(give({ certifierEmail: other.accounts.certifier.email })).expect(201)
    const reader = await house.as(other.accounts.certifier)
    await reader.get(at('/records')).expect(200)
    const end = () => owner.post(at(`/grants/${grant.id}/end`)).send({ revision: grant.revision, password: PASSWORD })
    // The document is held back until the grant has ended.
    const { render } = house.services.reports
    house.services.reports.render = (job) => {
      const held = new PassThrough()
      // Refused, the document is thrown away in the middle: the rest of it finds nobody.
      void end().then(() => pipeline(render.call(house.services.reports, job), held)).catch(() => undefined)
      return held
    }
    const late = await reader.get(at('/seasons/2026/pdf')).buffer(true)
    house.services.reports.render = render.bind(house.services.reports)
    const heads = (await journalOf({ kind: 'report' })).length
    expect(late.status).toBe(404)
    expect(late.body.code).toBe('not_found')
    for (const path of ['', '/records', '/blocks', '/seasons', '/seasons/2026/pdf', '/seasons/2026/csv', `/records/${uuidV7()}`]) await reader.get(at(path)).expect(404)
    expect((await reader.get('/api/my-farms').expect(200)).body.items.map(({ farmId }: { farmId: string }) => farmId)).toEqual([other.id])
    expect((await journalOf({ kind: 'report' })).length).toBe(heads)
    expect((await end()).status).toBe(409)
    expect((await owner.patch(at(`/grants/${grant.id}`)).send({ revision: grant.revision + 1, endsOn: '2027-03-01', password: PASSWORD })).body.code).toBe('grant.ended')
  })

  it('can be moved, and is asked for at each page of a table', async () => {
    const { id, revision } = await ownGrant()
    const changed = await owner.patch(at(`/grants/${id}`)).send({ revision, endsOn: '2026-06-20', seasons: [2025, 2026], password: PASSWORD }).expect(200)
    expect(changed.body).toMatchObject({ endsOn: '2026-06-20', seasons: [2025, 2026], revision: revision + 1 })
    expect((await owner.patch(at(`/grants/${id}`)).send({ revision, endsOn: '2026-06-21', password: PASSWORD })).body).toMatchObject({ code: 'stale', current: { endsOn: '2026-06-20' } })
    expect((await certifier.get(at('/seasons')).expect(200)).body.items).toMatchObject([{ season: 2026 }, { season: 2025, records: 1 }])
    // The last day goes to its end on the farm: 20 June, 23:30 in Los Angeles.
    house.setNow('2026-06-21T06:30:00Z')
    await certifier.get(at('/seasons/2026/csv')).expect(200)
    expect((await certifier.get('/api/session').expect(200)).body.hadGrants).toBe(false)
    house.setNow('2026-06-21T07:00:00Z')
    await certifier.get(at('/seasons/2026/csv')).expect(404)
    const { body } = await certifier.get('/api/my-farms').expect(200)
    expect(body.items).toEqual([])
    expect(body.ended[0]).toEqual({ farmName: expect.stringMatching(/^Farm /), seasons: [2025, 2026], endedOn: '2026-06-20', givenBy: expect.any(String) })
    expect((await certifier.get('/api/session').expect(200)).body).toMatchObject({ memberships: [], hadGrants: true })
    house.setNow(NOW)
    await owner.patch(at(`/grants/${id}`)).send({ revision: revision + 1, endsOn: '2026-12-31', seasons: [2026], password: PASSWORD }).expect(200)
  })
})

describe('the journal', () => {
  it('is filtered by person, kind, day of the farm and thing, and goes on page by page', async () => {
    const all = await owner.get(at('/journal')).query({ limit: 3 }).expect(200)
    const next = await owner.get(at('/journal')).query({ limit: 3, cursor: all.body.next }).expect(200)
    expect([...all.body.items, ...next.body.items].map(({ id }: { id: string }) => id)).toHaveLength(6)
    expect(new Set([...all.body.items, ...next.body.items].map(({ id }: { id: string }) => id)).size).toBe(6)
    await owner.get(at('/journal')).query({ cursor: all.body.next, kind: 'lot' }).expect(422)
    const lots = await journalOf({ kind: 'lot' })
    expect(lots.map(({ action }) => action)).toEqual(['lot.received'])
    expect(await journalOf({ subject: things.lotId })).toEqual(lots)
    expect(await journalOf({ person: farm.personIds.applicator })).toEqual([])
    expect((await journalOf({ day: '2026-06-16' })).length).toBeGreaterThan(5)
    expect(await journalOf({ day: '2026-06-15' })).toEqual([])
  })

  it('says where from: the network without its end, and the names of browser and system', async () => {
    const mark = uuidV7()
    await owner.post(at('/materials')).set('User-Agent', 'Mozilla/5.0 (Android 14; Mobile; rv:127.0) Gecko/127.0 Firefox/127.0')
      .send({ id: mark, name: '=HYPERLINK("http://bad.example")', kind: 'other', measuredIn: 'volume', organicStatus: 'allowed' }).expect(201)
    expect(await journalOf({ subject: mark })).toMatchObject([{ from: { network: '127.0.0.0/24', device: 'Firefox, Android' } }])
    const { text } = await owner.get(at('/journal/csv')).query({ subject: mark, language: 'es' }).expect(200)
    const [row] = parse(text, { bom: true, columns: true }) as Record<string, string>[]
    expect(row).toMatchObject({ Qué: 'Añadió un insumo', 'Sobre qué': `'=HYPERLINK("http://bad.example")`, Con: 'Firefox, Android' })
  })

  it('is not for a certifier, nor for who sprays', async () => {
    const sprayer = await house.as(farm.accounts.applicator)
    expect((await certifier.get(at('/journal'))).status).toBe(403)
    expect((await sprayer.get(at('/journal/csv'))).status).toBe(403)
  })
})
