import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildRecord, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, PASSWORD, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { readText } from '../support/readPdf.ts'
import { seedThings, type SeededThings } from '../support/seedThings.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent
let things: SeededThings

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
  things = await seedThings(house, farm)
})
afterAll(() => house.close())

let place = 10
const at = (path: string) => `/api/farms/${farm.id}/${path}`
/** A block of its own for one test. */
async function draw(code: string, geometry = squareAt((place += 1))) {
  return (await manager.post(at('blocks')).send(buildBlock({ code, geometry })).expect(201)).body
}
const read = async (id: string) => (await manager.get(at(`blocks/${id}`)).expect(200)).body
const codes = async (query = '') => (await manager.get(at(`blocks?limit=200${query}`)).expect(200)).body.items.map(({ code }: { code: string }) => code)
type Ring = [number, number][]
const ringOf = ({ geometry }: { geometry: { coordinates: number[][][] } }) => geometry.coordinates[0] as Ring
const box = (west: number, south: number, east: number, north: number) =>
  ({ type: 'Polygon', coordinates: [[[west, south], [east, south], [east, north], [west, north], [west, south]].map(([lon = 0, lat = 0]) => [Number(lon.toFixed(7)), Number(lat.toFixed(7))])] })
/** The square of a block cut in two at a share of its width. */
function halves(block: { geometry: { coordinates: number[][][] } }, share = 0.5) {
  const [[west, south], , [east, north]] = ringOf(block) as [[number, number], [number, number], [number, number]]
  const middle = west + (east - west) * share
  return [box(west, south, middle, north), box(middle, south, east, north)] as const
}
const partsOf = (block: { code: string; geometry: { coordinates: number[][][] } }, [a, b] = halves(block)) => [
  { id: uuidV7(), code: `${block.code}a`, name: 'West half', geometry: a },
  { id: uuidV7(), code: `${block.code}b`, name: 'East half', geometry: b },
]
async function sign(blockId: string, startedAt?: string) {
  const input = buildRecord({ ...things, blockId, ...(startedAt !== undefined && { startedAt, endedAt: startedAt }) })
  await manager.post(at('records')).send(input).expect(201)
  await manager.post(at(`records/${input.id}/sign`)).send({ password: PASSWORD }).expect(200)
  return input.id
}
const pdfOf = async (id: string) => readText(Buffer.from((await manager.get(at(`records/${id}/pdf`)).expect(200)).body))

describe('changing a block', () => {
  it('writes a boundary version for another outline and none for the same one', async () => {
    const block = await draw('C1')
    expect(block).toMatchObject({ endedOn: null, endedBy: null, fromIds: [], intoIds: [], land: null, counts: { plants: null, beds: null, rows: null, rowM: null } })
    const renamed = await manager.patch(at(`blocks/${block.id}`)).send({ revision: 1, name: 'Renamed', crop: 'Pear' }).expect(200)
    expect(renamed.body).toMatchObject({ name: 'Renamed', crop: 'Pear', version: 1, revision: 2 })
    const turned = { type: 'Polygon', coordinates: [[...ringOf(block).slice(2, -1), ...ringOf(block).slice(0, 3)]] }
    const same = await manager.patch(at(`blocks/${block.id}`)).send({ revision: 2, geometry: turned }).expect(200)
    expect(same.body.version).toBe(1)
    const [west] = halves(block)
    const smaller = await manager.patch(at(`blocks/${block.id}`)).send({ revision: 3, geometry: west, drawnOn: '2026-03-12', note: 'Walked with the neighbour' }).expect(200)
    expect(smaller.body).toMatchObject({ version: 2, revision: 4 })
    expect(smaller.body.areaM2).toBeCloseTo(block.areaM2 / 2, -1)
    const { body } = await manager.get(at(`blocks/${block.id}/boundaries`)).expect(200)
    expect(body.items).toMatchObject([
      { version: 2, drawnOn: '2026-03-12', note: 'Walked with the neighbour', areaM2: smaller.body.areaM2, records: [] },
      { version: 1, drawnOn: '2026-06-16', note: null, areaM2: block.areaM2 },
    ])
    expect(body.items[0].by).toMatch(/^manager/)
  })

  it('refuses a stale revision, a taken code and a day to come, and changes nothing', async () => {
    const block = await draw('C2')
    const patch = (body: object) => manager.patch(at(`blocks/${block.id}`)).send(body)
    expect((await patch({ revision: 7, name: 'No' })).body).toMatchObject({ status: 409, code: 'stale', current: { id: block.id, revision: 1 } })
    expect((await patch({ revision: 1, code: 'c1' })).body).toMatchObject({ status: 409, errors: [{ path: 'code', code: 'code.taken' }] })
    expect((await patch({ revision: 1, drawnOn: '2026-06-17' })).body.errors).toMatchObject([{ path: 'drawnOn', code: 'time.future' }])
    expect(await read(block.id)).toEqual(block)
  })

  it('judges the outline as a new block’s, itself left out', async () => {
    const block = await draw('C3')
    const other = await draw('C4')
    const grown = await manager.patch(at(`blocks/${block.id}`)).send({ revision: 1, geometry: other.geometry })
    expect(grown.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ path: 'geometry', code: 'geometry.overlap', params: { code: 'C4' } }] })
    const flat = await manager.patch(at(`blocks/${block.id}`)).send({ revision: 1, geometry: { type: 'Point', coordinates: [0, 0] } })
    expect(flat.body.errors[0].code).toBe('geometry.type')
    await manager.patch(at(`blocks/${block.id}`)).send({ revision: 1, geometry: halves(block)[0] }).expect(200)
  })
})

describe('a signed record', () => {
  it('keeps the boundary it was signed on: its PDF prints the old area after the block has shrunk', async () => {
    const block = await draw('R1')
    const recordId = await sign(block.id)
    const before = await pdfOf(recordId)
    expect(before).toMatch(/R1 version 1 .* whole 0\.88 /)
    await manager.patch(at(`blocks/${block.id}`)).send({ revision: 1, geometry: halves(block)[0] }).expect(200)
    const newer = await sign(block.id)
    expect(await pdfOf(recordId)).toBe(before)
    expect(await pdfOf(newer)).toMatch(/R1 version 2 .* whole 0\.44 /)
    const { body } = await manager.get(at(`blocks/${block.id}/boundaries`)).expect(200)
    expect(body.items.map(({ version, records }: { version: number; records: { id: string }[] }) => [version, records.map(({ id }) => id)])).toEqual([[2, [newer]], [1, [recordId]]])
  })
})

describe('cutting a block', () => {
  it('ends it and begins its parts, which may keep its code', async () => {
    const block = await draw('S1')
    await manager.put(at(`blocks/${block.id}/land`)).send({ revision: 1, status: 'certified', statusSince: '2019-04-02' }).expect(200)
    const [first, second] = partsOf(block, halves(block, 0.33333))
    const parts = [{ ...first, code: 'S1' }, second]
    const command = { revision: 2, parts }
    const { body } = await manager.post(at(`blocks/${block.id}/split`)).send(command).expect(200)
    expect(body.ended).toMatchObject([{ id: block.id, endedOn: '2026-06-16', endedBy: 'split', intoIds: parts.map((part) => part?.id) }])
    expect(body.open).toMatchObject([{ code: 'S1', fromIds: [block.id], land: { status: 'certified' }, crop: block.crop }, { code: 'S1b' }])
    const sum = body.open.reduce((total: number, { areaM2 }: { areaM2: number }) => total + areaM2, 0)
    expect(Math.abs(sum / block.areaM2 - 1)).toBeLessThan(1e-6)
    expect((await manager.post(at(`blocks/${block.id}/split`)).send(command).expect(200)).body).toEqual(body)
    expect((await codes()).filter((code: string) => code === 'S1')).toHaveLength(1)
    expect((await codes('&ended=true')).filter((code: string) => code === 'S1')).toHaveLength(2)
  })

  it.each([
    { name: 'a part beyond it', change: (a: object, b: object) => [a, b, squareAt(500)], code: 'split.outside' },
    { name: 'parts over each other', change: (a: object, b: object, whole: object) => [whole, b, a], code: 'split.overlap' },
    { name: 'ground left over', change: (a: object, _b: object, _whole: object, quarter: object) => [a, quarter], code: 'split.sum' },
    { name: 'a bow-tie', change: (a: object) => [a, { type: 'Polygon', coordinates: [[[0, 0], [0.01, 0.01], [0.01, 0], [0, 0.01], [0, 0]]] }], code: 'geometry.self_intersection' },
  ])('refuses $name, all of it', async ({ change, code }) => {
    const block = await draw(`S${(place += 1)}`)
    const [a, b] = halves(block)
    const quarter = halves({ geometry: b })[0]
    const parts = change(a, b, block.geometry, quarter).map((geometry, index) => ({ id: uuidV7(), code: `Q${place}${index}`, name: 'Part', geometry }))
    const refused = await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts })
    expect(refused.status).toBe(422)
    expect(refused.body.errors.map((error: { code: string }) => error.code)).toContain(code)
    expect(refused.body.detail).not.toMatch(/problems\.|\{/)
    expect(await read(block.id)).toEqual(block)
    expect((await codes('&ended=true')).some((each: string) => each.startsWith(`Q${place}`))).toBe(false)
  })

  it('refuses a code that another block bears, and ends nothing', async () => {
    const block = await draw('S9')
    const parts = partsOf(block).map((part) => ({ ...part, code: 'C2' }))
    const twice = await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts })
    expect(twice.body.errors).toMatchObject([{ path: 'parts.1.code', code: 'code.taken' }])
    const taken = await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts: [{ ...parts[0] }, { ...parts[1], code: 'S9b' }] })
    expect(taken.body).toMatchObject({ status: 409, errors: [{ path: 'parts.0.code', code: 'code.taken' }] })
    expect(await read(block.id)).toEqual(block)
  })

  it('lets a thief of codes and a second cut come too late', async () => {
    const block = await draw('S10')
    const cut = (parts: object[]) => manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts })
    const answers = await Promise.all([cut(partsOf(block)), cut(partsOf(block))])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect((await codes()).filter((code: string) => code.startsWith('S10'))).toEqual(['S10a', 'S10b'])
  })
})

describe('a block that has ended', () => {
  it('takes no new record, lets an old one be amended, and is named in words', async () => {
    const block = await draw('E1')
    const recordId = await sign(block.id)
    await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts: partsOf(block) }).expect(200)
    const refused = await manager.post(at('records')).send(buildRecord({ ...things, blockId: block.id }))
    expect(refused.body).toMatchObject({ status: 422, errors: [{ path: 'lines.0.blockId', code: 'block.ended', params: { code: 'E1' } }] })
    expect(refused.body.detail).toContain('E1')
    // What was done before the block ended can always be recorded.
    await manager.post(at('records')).send(buildRecord({ ...things, blockId: block.id, startedAt: '2026-06-12T13:00:00Z', endedAt: '2026-06-12T14:00:00Z' })).expect(201)
    const amended = await manager.post(at(`records/${recordId}/amend`)).send({ reason: 'The purpose was left out', purpose: 'Soil life' })
    expect(amended.body).toMatchObject({ version: 2, purpose: 'Soil life' })
    expect(await pdfOf(recordId)).toMatch(/E1 version 1 .* whole 0\.88 /)
    expect((await manager.patch(at(`blocks/${block.id}`)).send({ revision: 2, name: 'No' })).body).toMatchObject({ status: 409, code: 'block.already_ended' })
    const planted = await manager.post(at('plantings')).send({ id: uuidV7(), blockId: block.id, crop: 'Apple' })
    expect(planted.body.errors).toMatchObject([{ path: 'blockId', code: 'block.ended' }])
  })

  it('lets a draft that named it be written on and signed', async () => {
    const block = await draw('E2')
    const { id, ...input } = buildRecord({ ...things, blockId: block.id })
    await manager.post(at('records')).send({ id, ...input }).expect(201)
    await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts: partsOf(block) }).expect(200)
    await manager.put(at(`records/${id}`)).send({ ...input, revision: 1, purpose: 'Soil life' }).expect(200)
    const signed = await manager.post(at(`records/${id}/sign`)).send({ password: PASSWORD })
    expect(signed.body).toMatchObject({ state: 'signed', purpose: 'Soil life' })
  })
})

describe('undoing a cut', () => {
  it('opens the block again and ends its parts', async () => {
    const block = await draw('U1')
    const parts = partsOf(block).map((part, index) => (index === 0 ? { ...part, code: 'U1' } : part))
    await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts }).expect(200)
    const { body } = await manager.post(at(`blocks/${block.id}/reopen`)).send({ revision: 2 }).expect(200)
    expect(body.open).toMatchObject([{ id: block.id, code: 'U1', endedOn: null, endedBy: null, intoIds: [], revision: 3, version: 1 }])
    expect(body.ended).toMatchObject(parts.map(({ id }) => ({ id, endedBy: 'undone' })))
    expect((await codes()).filter((code: string) => code.startsWith('U1'))).toEqual(['U1'])
    expect((await manager.post(at(`blocks/${block.id}/reopen`)).send({ revision: 3 })).body).toMatchObject({ status: 409, code: 'block.not_ended' })
  })

  it.each([
    { what: 'a record', use: (id: string) => sign(id) },
    { what: 'a change', use: (id: string) => manager.patch(at(`blocks/${id}`)).send({ revision: 1, name: 'Other' }).expect(200) },
    { what: 'a planting', use: (id: string) => manager.post(at('plantings')).send({ id: uuidV7(), blockId: id, crop: 'Apple' }).expect(201) },
    { what: 'an event', use: (id: string) => manager.post(at('farm-events')).send({ id: uuidV7(), kind: 'mown', blockIds: [id], on: '2026-06-16' }).expect(201) },
  ])('is refused once a part has $what', async ({ use }) => {
    const block = await draw(`U${(place += 1)}`)
    const parts = partsOf(block)
    await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts }).expect(200)
    await use(parts[1]?.id ?? '')
    expect((await manager.post(at(`blocks/${block.id}/reopen`)).send({ revision: 2 })).body).toMatchObject({ status: 409, code: 'block.reopen_used' })
    expect(await read(block.id)).toMatchObject({ endedBy: 'split' })
  })
})

describe('putting blocks together', () => {
  const merge = (blocks: { id: string; revision: number }[], block: object = {}, more: object = {}) =>
    manager.post(at('blocks/merge')).send({ blocks: blocks.map(({ id, revision }) => ({ id, revision })), block: { id: uuidV7(), code: `M${(place += 1)}`, name: 'Joined', ...block }, ...more })

  it('gives back what was cut, to the corner, and can be undone', async () => {
    const block = await draw('M1')
    const cut = await manager.post(at(`blocks/${block.id}/split`)).send({ revision: 1, parts: partsOf(block, halves(block, 0.37)) }).expect(200)
    const joined = (await merge(cut.body.open, { code: 'M1' }).expect(200)).body
    expect(joined.open).toMatchObject([{ code: 'M1', crop: block.crop, fromIds: cut.body.open.map(({ id }: { id: string }) => id), geometry: { type: 'Polygon' } }])
    expect(new Set(ringOf(joined.open[0]).map(String))).toEqual(new Set(ringOf(block).map(String)))
    expect(Math.abs(joined.open[0].areaM2 / block.areaM2 - 1)).toBeLessThan(1e-6)
    expect(joined.ended).toMatchObject([{ endedBy: 'merge', intoIds: [joined.open[0].id] }, { endedBy: 'merge' }])
    const undone = await manager.post(at(`blocks/${joined.ended[1].id}/reopen`)).send({ revision: joined.ended[1].revision }).expect(200)
    expect(undone.body.open.map(({ code }: { code: string }) => code)).toEqual(['M1a', 'M1b'])
    expect(undone.body.ended).toMatchObject([{ id: joined.open[0].id, endedBy: 'undone' }])
  })

  it('asks about pieces that touch nowhere, and is done once', async () => {
    const [one, two] = [await draw('M2'), await draw('M3')]
    const asked = await merge([one, two])
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ path: 'blocks', code: 'geometry.apart' }] })
    expect(await read(one.id)).toEqual(one)
    const block = { id: uuidV7(), code: 'M23', name: 'Two pieces' }
    const more = { acknowledged: [{ code: 'geometry.apart', reason: 'The lane runs between' }] }
    const { body } = await merge([one, two], block, more).expect(200)
    expect(body.open).toMatchObject([{ geometry: { type: 'MultiPolygon' } }])
    expect(body.open[0].areaM2).toBeCloseTo(one.areaM2 + two.areaM2, 3)
    expect((await merge([one, two], block, more).expect(200)).body).toEqual(body)
  })

  it('refuses all of it where one of them is stale, unknown, named twice or the code is taken', async () => {
    const [one, two] = [await draw('M4'), await draw('M5')]
    const more = { acknowledged: [{ code: 'geometry.apart', reason: 'One field' }] }
    expect((await merge([one, { ...two, revision: 4 }], {}, more)).body).toMatchObject({ status: 409, code: 'stale', current: { id: two.id } })
    expect((await merge([one, { id: uuidV7(), revision: 1 }], {}, more)).body.errors).toMatchObject([{ path: 'blocks.1.id', code: 'block.unknown' }])
    expect((await merge([one, one], {}, more)).body.errors).toMatchObject([{ path: 'blocks', code: 'merge.twice' }])
    expect((await merge([one, two], { code: 'C2' }, more)).body).toMatchObject({ status: 409, errors: [{ path: 'block.code', code: 'code.taken' }] })
    expect([await read(one.id), await read(two.id)]).toEqual([one, two])
  })
})

describe('how the land stands', () => {
  const land = {
    status: 'transition', statusSince: '2025-05-01', lastProhibited: { substance: 'A weedkiller', on: '2016-04-01', proof: 'Letter of the seller' },
    tenure: 'rented', tenureUntil: '2031-02-28', tenureNote: null,
  }
  it('is said once for the block, over the revision that was seen', async () => {
    const block = await draw('L1')
    const { body } = await manager.put(at(`blocks/${block.id}/land`)).send({ revision: 1, ...land }).expect(200)
    expect(body).toMatchObject({ revision: 2, version: 1, land })
    expect((await manager.put(at(`blocks/${block.id}/land`)).send({ revision: 1, ...land })).status).toBe(409)
    const future = await manager.put(at(`blocks/${block.id}/land`)).send({ revision: 2, ...land, lastProhibited: { ...land.lastProhibited, on: '2027-01-01' } })
    expect(future.body.errors).toMatchObject([{ path: 'lastProhibited.on', code: 'time.future' }])
    const unknown = await manager.put(at(`blocks/${block.id}/land`)).send({ revision: 2, ...land, status: 'organic' })
    expect(unknown.body.errors).toMatchObject([{ path: 'status' }])
  })
})
