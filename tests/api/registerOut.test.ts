import { parse } from 'csv-parse/sync'
import { v7 as uuidV7 } from 'uuid'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Decimal } from 'decimal.js'
import { buildRecord } from '../../server/demo/buildThings.ts'
import type { ApplicationRecord, RegisterRow } from '../../shared/contract/record.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { readPdf } from '../support/readPdf.ts'
import { seedAsOwner } from '../support/seedManyRecords.ts'
import { seedThings } from '../support/seedThings.ts'

const RECORDS = 300

let house: TestHouse
let farm: TestFarm
let manager: Agent
let certifier: Agent
let everything: RegisterRow[]

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm({ seasons: [2025] })
  await seedAsOwner(house.ownerUrl, { farmId: farm.id, count: RECORDS, from: '2024-02-01T00:00:00Z' })
  manager = await house.as(farm.accounts.manager)
  certifier = await house.as(farm.accounts.certifier)
  const first = await manager.get(address('/records?limit=200')).expect(200)
  const second = await manager.get(address(`/records?limit=200&cursor=${first.body.next as string}`)).expect(200)
  everything = [...first.body.items, ...second.body.items]
}, 120_000)
afterAll(() => house.close())

const address = (rest: string, id = farm.id) => `/api/farms/${id}${rest}`
const sum = (rows: readonly RegisterRow[], name: 'areaHa' | 'totalL' | 'totalKg') =>
  rows.reduce((total, row) => total.plus(row[name] ?? 0), new Decimal(0)).toFixed()

describe('totals of the register', () => {
  it.each(['', '?method=drench', '?season=2025', '?state=withdrawn', '?q=bank', '?season=2025&q=soap'])('add up the signed records of %s exactly', async (query) => {
    const { body } = await manager.get(address(`/register/totals${query}`)).expect(200)
    const { body: list } = await manager.get(address(`/records${query === '' ? '?' : `${query}&`}limit=200`)).expect(200)
    const rows = query === '' ? everything : list.items as RegisterRow[]
    const signed = rows.filter(({ state }) => state === 'signed')
    expect(body).toMatchObject({
      records: signed.length, areaHa: sum(signed, 'areaHa'), totalL: sum(signed, 'totalL'), totalKg: sum(signed, 'totalKg'), found: rows.length,
      withdrawn: rows.filter(({ state }) => state === 'withdrawn').length, unsigned: rows.filter(({ state }) => state === 'started').length,
      late: signed.filter(({ lateHours }) => lateHours !== null).length,
    })
    const drenches = signed.filter(({ method }) => method === 'drench')
    if (drenches.length > 0) expect(body.byMethod.drench).toEqual({ records: drenches.length, areaHa: sum(drenches, 'areaHa'), totalL: sum(drenches, 'totalL'), totalKg: sum(drenches, 'totalKg') })
  })

  it('are of the granted seasons for a certifier', async () => {
    const { body } = await certifier.get(address('/register/totals')).expect(200)
    expect(body).toMatchObject({ found: everything.filter(({ season }) => season === 2025).length, unsigned: 0 })
  })
})

describe('the register as CSV', () => {
  const fetchCsv = async (query = '', agent = manager, id = farm.id) => {
    const { text, headers } = await agent.get(address(`/register/csv${query}`, id)).expect(200)
    return { text: String(text), headers }
  }
  const read = (text: string) => parse(text, { bom: true, columns: true, record_delimiter: '\r\n' }) as Record<string, string>[]

  it('is UTF-8 with its mark, CRLF, a head and one line a block of a record', async () => {
    const { text, headers } = await fetchCsv()
    expect(headers).toMatchObject({ 'content-type': 'text/csv; charset=utf-8', 'content-disposition': 'attachment; filename="register-2026-06-16.csv"' })
    expect(text.startsWith('\uFEFFRecord,Version,State,')).toBe(true)
    expect(text.endsWith('\r\n')).toBe(true)
    const lines = read(text)
    expect(lines).toHaveLength(everything.reduce((count, { blocks }) => count + blocks.length, 0))
    expect(lines.map((line) => line['Record'])).toEqual(everything.flatMap(({ number, blocks }) => blocks.map(() => number ?? '')))
  })

  it('has the figures of the record and times with the farm’s offset', async () => {
    const own = await house.makeFarm()
    const things = await seedThings(house, own)
    const agent = await house.as(own.accounts.applicator)
    const input = buildRecord({ ...things, purpose: '=HYPERLINK("http://x.example")', notes: null })
    await agent.post(address('/records', own.id)).send(input).expect(201)
    const { body } = await agent.post(address(`/records/${input.id}/sign`, own.id)).send({ password: PASSWORD }).expect(200) as { body: ApplicationRecord }
    const [line] = read((await fetchCsv('', agent, own.id)).text)
    expect(line).toMatchObject({
      Record: '2026-0001', Version: '1', State: 'signed', Season: '2026', Method: 'soil drench', Block: 'B1', 'Part treated': 'whole',
      'Area treated, ha': new Decimal(body.computed.areaM2).div(10_000).toDecimalPlaces(4).toFixed(),
      Start: '2026-06-16T06:00:00-07:00', End: '2026-06-16T06:40:00-07:00', 'Time zone': 'America/Los_Angeles',
      'Amount on this block': '420', Unit: 'L', 'How known': 'worked out', 'Preparations of the record': 'Nettle ferment, 20 L', 'Lots, in the same order': 'N-1',
      'Share of the mix, L': '420', 'Carrier water from': 'Rain tank 2', For: '\'=HYPERLINK("http://x.example")', 'Check code': (body.digest ?? '').slice(0, 20),
    })
  })

  it.each(['@SUM(1)', '+1', '-1', '＝1', '\tx'])('makes no formula of %j', async (purpose) => {
    const own = await house.makeFarm()
    const things = await seedThings(house, own)
    const agent = await house.as(own.accounts.applicator)
    await agent.post(address('/records', own.id)).send(buildRecord({ ...things, purpose: `x, "${purpose}"`, notes: null })).expect(201)
    await agent.post(address('/records', own.id)).send(buildRecord({ ...things, purpose, notes: null })).expect(201)
    const purposes = read((await fetchCsv('?sort=when', agent, own.id)).text).map((line) => line['For']).sort()
    expect(purposes).toEqual([`'${purpose.trim()}`, `x, "${purpose}"`].map((text) => (purpose === '\tx' && !text.startsWith('x,') ? 'x' : text)).sort())
  })

  it('speaks the language asked for, in the order and by the filter asked for', async () => {
    const lines = read((await fetchCsv('?language=es&method=drench&sort=number&state=signed')).text)
    const expected = everything.filter(({ method, state }) => method === 'drench' && state === 'signed')
    expect(new Set(lines.map((line) => line['Registro'])).size).toBe(expected.length)
    expect(lines.every((line) => line['Método'] === 'aplicación al suelo' && line['Estado'] === 'firmado')).toBe(true)
    expect(lines.map((line) => line['Registro'])).toEqual(lines.map((line) => line['Registro']).sort())
  })

  it('gives a certifier the seasons that are granted', async () => {
    const seasons = new Set(read((await fetchCsv('', certifier)).text).map((line) => line['Season']))
    expect([...seasons]).toEqual(['2025'])
  })

  it('refuses a filter as the list does', async () => {
    for (const query of ['sort=password', 'language=fr', 'q=', 'season=1&season=2', 'cursor=a', 'limit=5']) {
      expect((await manager.get(address(`/register/csv?${query}`))).status, query).toBe(422)
    }
  })
})

describe('the register on paper', () => {
  it('prints what was chosen, in as many volumes as it says', async () => {
    const block = everything[0]?.blocks[0]?.id ?? ''
    const volumes = await manager.get(address(`/register/volumes?state=signed&block=${block}`)).expect(200)
    const expected = everything.filter(({ blocks, state }) => state === 'signed' && blocks.some(({ id }) => id === block))
    expect(volumes.body).toEqual({ volumes: 1, records: expected.length, items: [{ records: expected.length }] })
    const { body, headers } = await manager.get(address(`/register/pdf?state=signed&block=${block}&sort=number`)).buffer(true).parse((response, done) => {
      const chunks: Buffer[] = []
      response.on('data', (chunk: Buffer) => { chunks.push(chunk) })
      response.on('end', () => { done(null, Buffer.concat(chunks)) })
    }).expect(200)
    expect(headers['content-type']).toBe('application/pdf')
    const { check, text } = readPdf(body as Buffer)
    expect(check).toContain('No syntax or stream encoding errors')
    expect([...text.matchAll(/20\d\d-\d{4}/g)].map(([number]) => number)).toEqual(expected.map(({ number }) => number ?? '').sort())
  }, 90_000)

  it('says how many volumes there are when another is asked for', async () => {
    const { status, body } = await manager.get(address('/register/pdf?volume=2&season=2025'))
    expect([status, body.errors[0]]).toEqual([422, expect.objectContaining({ path: 'volume', code: 'field.too_big', params: { maximum: 1 } })])
    expect((await manager.get(address('/register/pdf?volume=0'))).status).toBe(422)
  })
})

describe('kept filters', () => {
  it('are one’s own, a certifier’s too, and nobody else’s', async () => {
    const input = { id: uuidV7(), name: 'Drenches of last year', query: { method: 'drench', season: 2025, sort: 'number' } }
    const made = await certifier.post(address('/saved-filters')).send(input).expect(201)
    expect(made.body).toMatchObject(input)
    await certifier.post(address('/saved-filters')).send(input).expect(200)
    expect((await certifier.post(address('/saved-filters')).send({ ...input, name: 'Another' })).status).toBe(422)
    expect((await certifier.get(address('/saved-filters')).expect(200)).body.items.map(({ name }: { name: string }) => name)).toEqual([input.name])
    expect((await manager.get(address('/saved-filters')).expect(200)).body.items).toEqual([])
    expect((await manager.delete(address(`/saved-filters/${input.id}`))).status).toBe(404)
    await certifier.delete(address(`/saved-filters/${input.id}`)).expect(204)
    expect((await certifier.get(address('/saved-filters')).expect(200)).body.items).toEqual([])
    expect((await certifier.delete(address(`/saved-filters/${input.id}`))).status).toBe(404)
  })

  it('are refused when the register could not be read by them', async () => {
    for (const query of [{ method: 'smoke' }, { season: 'x' }, { q: '--' }, { limit: 5 }, { sort: 'id' }]) {
      expect((await manager.post(address('/saved-filters')).send({ id: uuidV7(), name: 'No', query })).status).toBe(422)
    }
  })
})
