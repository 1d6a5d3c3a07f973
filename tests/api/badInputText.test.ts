import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildBlock, buildLot, buildMaterial, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { inviteOwner } from '../../server/services/welcome.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'
import { expectRefused, faultsOf } from '../support/sendBad.ts'

/** Words that are none or would do harm, and words that only look odd; rows of the catalogue of bad input, section text. */
let house: TestHouse
let farm: TestFarm
let things: SeededThings
let manager: Agent
let place = 1

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  things = await seedThings(house, farm)
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const note = (notes: string) => () => ({ ...buildRecord(things), notes })
const named = (name: string) => () => ({ ...buildBlock({ code: `T${(place += 1)}`, geometry: squareAt(place) }), name })

describe('is refused in words, and nothing is stored', () => {
  it.each([
    { what: 'B-56 a note of 4,001 characters', path: '/records', body: note('a'.repeat(4_001)), errors: ['notes text.too_long'] },
    { what: 'B-57 a NUL in a note', path: '/records', body: note('a\u0000b'), errors: ['notes text.control'] },
    { what: 'B-57 a NUL in a name', path: '/blocks', body: named('a\u0000b'), errors: ['name text.control'] },
    { what: 'B-58 half a character', path: '/records', body: note('a\ud800'), errors: ['notes text.control'] },
    { what: 'B-61 a right-to-left override', path: '/blocks', body: named('Bank\u202Egpj.exe'), errors: ['name text.bidi_control'] },
    { what: 'B-61 an isolate', path: '/records', body: note('a\u2066b\u2069'), errors: ['notes text.bidi_control'] },
    { what: 'B-64 only spaces', path: '/blocks', body: named(' \t '), errors: ['name text.required'] },
    { what: 'B-64 nothing that shows', path: '/blocks', body: named('\u200B\u200D\u2060'), errors: ['name text.required'] },
    { what: 'B-64 a name of nothing', path: '/materials', body: () => ({ ...buildMaterial(), name: '' }), errors: ['name text.required'] },
    { what: 'B-69 a line end in a name', path: '/blocks', body: named('A\r\nBcc: x@y.example'), errors: ['name text.line_break'] },
    { what: 'B-69 a line end in a lot', path: '/lots', body: () => ({ ...buildLot({ materialId: things.materialId }), code: 'A\nB' }), errors: ['code text.line_break'] },
    { what: 'B-72 a prototype', path: '/materials', body: () => JSON.parse(`{"__proto__":{"role":"owner"},${JSON.stringify(buildMaterial({ name: 'Proto' })).slice(1)}`) as object, errors: ['__proto__ unknown_field'] },
    { what: 'B-72 a constructor', path: '/materials', body: () => ({ ...buildMaterial({ name: 'Proto' }), constructor: { role: 'owner' } }), errors: ['constructor unknown_field'] },
  ])('$what', (row) => expectRefused(house, farm, manager, row))

  it('B-56 a note of 10 MB', async () => {
    const { body } = await manager.post(`/api/farms/${farm.id}/records`).send(note('a'.repeat(10_000_000))()).expect(413)
    expect(body.code).toBe('too_large')
  })

  it('B-57 a NUL in an address', async () => {
    const answers = await Promise.all([`/api/farms/${farm.id}/blocks/%00`, `/api/farms/${farm.id}/blocks?cursor=%00`, '/api/check/%00'].map((there) => manager.get(there)))
    expect(answers.map(({ status }) => status)).toEqual([404, 422, 200])
  })

  it('B-69 a line end in the name of an account', async () => {
    const { token } = await inviteOwner(house.services, 'crlf@farm.example')
    const { body } = await manager.post('/api/welcome').send({ token, name: 'A\r\nBcc: x@y.example', password: 'a long enough password' }).expect(422)
    expect(faultsOf(body)).toEqual(['name text.line_break'])
  })

  it('B-73 the same key twice', async () => {
    const text = JSON.stringify(buildMaterial({ name: 'Twice' })).replace('{', '{"name":"Once",')
    const { body } = await manager.post(`/api/farms/${farm.id}/materials`).set('Content-Type', 'application/json').send(text).expect(400)
    expect(body.code).toBe('json_duplicate_key')
  })
})

describe('is kept as it was typed', () => {
  it.each([
    { what: 'B-59 an emoji and Cyrillic', text: '👩‍🌾 Олена полила' },
    { what: 'B-60 Arabic and Hebrew', text: 'المزرعة الشمالية שלום' },
    { what: 'B-65 an injection', text: '\'); drop table application_records;--' },
    { what: 'B-66 markup', text: '<img src=x onerror=alert(1)>' },
    { what: 'B-67 a formula', text: '=HYPERLINK("http://x.example")' },
    { what: 'B-67 what a table takes for a sum', text: '@SUM(1) +1 -1' },
    { what: 'B-68 templates', text: '{{7*7}} ${7*7} <%= 7*7 %>' },
    { what: 'B-70 an operator of PDF', text: ') Tj /OpenAction << /S /JavaScript' },
    { what: 'B-71 a false line of a log', text: '{"level":30,"msg":"all is well"}' },
  ])('$what', async ({ text }) => {
    const block = named(text)()
    const made = await manager.post(`/api/farms/${farm.id}/blocks`).send(block).expect(201)
    expect(made.body.name).toBe(text)
    const record = note(`${text}\n${text}`)()
    await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    const read = await manager.get(`/api/farms/${farm.id}/records/${record.id}`).expect(200)
    expect(read.body.notes).toBe(`${text}\n${text}`)
  })

  it('B-74 one word of 4,000 characters', async () => {
    const record = note('W'.repeat(4_000))()
    const { body } = await manager.post(`/api/farms/${farm.id}/records`).send(record).expect(201)
    expect(body.notes).toHaveLength(4_000)
  })
})

describe('what looks alike', () => {
  it('B-63 is one name, whichever way it is composed', async () => {
    const [composed, apart] = ['Süd'.normalize('NFC'), 'Süd'.normalize('NFD')]
    expect(apart).not.toBe(composed)
    await manager.post(`/api/farms/${farm.id}/blocks`).send(buildBlock({ code: composed, geometry: squareAt((place += 1)) })).expect(201)
    const { body } = await manager.post(`/api/farms/${farm.id}/blocks`).send({ ...buildBlock({ code: 'x', geometry: squareAt((place += 1)) }), code: apart }).expect(409)
    expect(faultsOf(body)).toEqual(['code code.taken'])
    const upper = await manager.post(`/api/farms/${farm.id}/blocks`).send({ ...buildBlock({ code: 'x', geometry: squareAt((place += 1)) }), code: 'SÜD' })
    expect(upper.status).toBe(409)
  })

  it('B-62 on purpose no name of a person is refused: the list shows the e-mail beside it', async () => {
    const { body } = await manager.get(`/api/farms/${farm.id}/people`).expect(200)
    for (const { email } of body.items) expect(email).toMatch(/@farm\.example$/)
  })
})
