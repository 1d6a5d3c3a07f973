import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { buildBlock, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent

beforeAll(async () => { house = await openHouse() })
beforeEach(async () => {
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const send = (blocks: readonly object[]) => manager.post(`/api/farms/${farm.id}/blocks/import`).send({ blocks })
const codes = async () => ((await manager.get(`/api/farms/${farm.id}/blocks?limit=200`)).body.items as { code: string }[]).map(({ code }) => code)
const made = (count: number, from = 0) => Array.from({ length: count }, (_, index) => buildBlock({ code: `I${index + from}`, geometry: squareAt(index + from) }))
const bowTie = { type: 'Polygon', coordinates: [[[0, 0], [0.01, 0.01], [0.01, 0], [0, 0.01], [0, 0]]] }

describe('several blocks at once', () => {
  it('come in together, measured, in their order, each in the journal with its first outline', async () => {
    const blocks = made(40)
    const response = await send(blocks)
    expect(response.status).toBe(201)
    expect(response.body.items.map(({ code }: { code: string }) => code)).toEqual(blocks.map(({ code }) => code))
    expect(response.body.items.every(({ areaM2 }: { areaM2: number }) => areaM2 > 8_700 && areaM2 < 8_900)).toBe(true)
    const drawn = await manager.get(`/api/farms/${farm.id}/blocks/${blocks[7]?.id ?? ''}/boundaries`)
    expect(drawn.body.items).toMatchObject([{ version: 1 }])
  })

  it('are one by one what drawing makes of them', async () => {
    const [one, two] = made(2)
    const drawn = await manager.post(`/api/farms/${farm.id}/blocks`).send(one)
    const imported = await send([two ?? {}])
    expect(Object.keys(imported.body.items[0]).sort()).toEqual(Object.keys(drawn.body).sort())
    expect(imported.body.items[0].areaM2).toBeCloseTo(drawn.body.areaM2, 3)
  })

  it('come in once, however often they are sent', async () => {
    const blocks = made(3)
    const [one, two] = await Promise.all([send(blocks), send(blocks)])
    expect([one.status, two.status].sort()).toEqual([200, 201])
    expect(one.body).toEqual(two.body)
    const other = await send(blocks.map((block, index) => (index === 1 ? { ...block, name: 'Another' } : block)))
    expect(other.status).toBe(422)
    expect(other.body.errors).toMatchObject([{ path: 'blocks.1.id', code: 'idempotency.mismatch' }])
    expect(await codes()).toHaveLength(3)
  })
})

describe('none comes in where one cannot', () => {
  it.each([
    { name: 'an outline that crosses itself', change: { geometry: bowTie }, status: 422, error: { path: 'blocks.2.geometry.coordinates.0', code: 'geometry.self_intersection' } },
    { name: 'a name without letters', change: { name: '  ' }, status: 422, error: { path: 'blocks.2.name', code: 'text.required' } },
    { name: 'a code twice, in other letters', change: { code: 'i0' }, status: 422, error: { path: 'blocks.2.code', code: 'code.taken' } },
    { name: 'ground of another one', change: { geometry: squareAt(1.1) }, status: 422, error: { path: 'blocks.2.geometry', code: 'geometry.overlap', params: { code: 'I1' } } },
    { name: 'a place far away', change: { geometry: squareAt(4_000) }, status: 422, error: { path: 'blocks.2.geometry', code: 'geometry.far_from_farm' } },
  ])('$name', async ({ change, status, error }) => {
    const response = await send(made(3).map((block, index) => (index === 2 ? { ...block, ...change } : block)))
    expect(response.status).toBe(status)
    expect(response.body.errors).toMatchObject([error])
    expect(await codes()).toEqual([])
  })

  it('a code and ground of a block that is there', async () => {
    await manager.post(`/api/farms/${farm.id}/blocks`).send(buildBlock({ code: 'i1', geometry: squareAt(60) })).expect(201)
    const response = await send(made(3))
    expect(response).toMatchObject({ status: 409, body: { errors: [{ path: 'blocks.1.code', code: 'code.taken' }] } })
    const over = await send([...made(1), buildBlock({ code: 'X', geometry: squareAt(60.1) })])
    expect(over).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ path: 'blocks.1.geometry', code: 'geometry.overlap', params: { code: 'i1' } }] } })
    expect(await codes()).toEqual(['i1'])
  })

  it('every fault is said at once', async () => {
    const response = await send(made(4).map((block, index) => (index % 2 === 0 ? { ...block, geometry: bowTie } : block)))
    expect(response.body.errors.map(({ path }: { path: string }) => path)).toEqual(['blocks.0.geometry.coordinates.0', 'blocks.2.geometry.coordinates.0'])
  })

  it('nothing, or more than there is room for', async () => {
    expect((await send([])).status).toBe(422)
    expect((await send(made(501))).status).toBe(422)
  })
})

it('a zip or a form is not read here: files are opened in the browser (B-17)', async () => {
  const path = `/api/farms/${farm.id}/blocks/import`
  expect((await manager.post(path).set('Content-Type', 'application/zip').send('PK')).status).toBe(415)
  expect((await manager.post(path).attach('file', Buffer.from('PK'), 'blocks.kmz')).status).toBe(415)
})

describe('what is unlikely', () => {
  it('passes with a reason on its own block alone', async () => {
    const [one, two] = [buildBlock({ code: 'A', geometry: squareAt(0) }), buildBlock({ code: 'B', geometry: squareAt(0.1) })]
    const acknowledged = [{ code: 'geometry.overlap', reason: 'Two tiers' }]
    expect((await send([{ ...one, acknowledged }, two])).status).toBe(422)
    expect((await send([one, { ...two, acknowledged }])).status).toBe(201)
  })
})

it('five hundred beside five hundred are judged and written in good time', async () => {
  await send(made(500)).expect(201)
  const response = await send(made(500, 500))
  expect(response.status).toBe(201)
  expect(response.body.items).toHaveLength(500)
})
