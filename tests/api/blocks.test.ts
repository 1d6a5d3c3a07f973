import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildBlock, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let farm: TestFarm
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
})
afterAll(() => house.close())

const post = (body: object) => manager.post(`/api/farms/${farm.id}/blocks`).send(body)
const count = async () => (await manager.get(`/api/farms/${farm.id}/blocks?limit=200`)).body.items.length as number
const ring = (...points: [number, number][]) => ({ type: 'Polygon', coordinates: [points] })

describe('drawing a block', () => {
  it('works out area and perimeter and gives version and revision', async () => {
    const response = await post(buildBlock({ code: 'A1', geometry: squareAt(0) }))
    expect(response.status).toBe(201)
    expect(response.body).toMatchObject({ code: 'A1', version: 1, revision: 1 })
    expect(response.body.areaM2).toBeGreaterThan(8_700)
    expect(response.body.areaM2).toBeLessThan(8_900)
  })

  it('is done once, however often it is sent', async () => {
    const block = buildBlock({ code: 'A2', geometry: squareAt(1) })
    const [one, two] = await Promise.all([post(block), post(block)])
    expect([one.status, two.status].sort()).toEqual([200, 201])
    expect(one.body).toEqual(two.body)
    const other = await post({ ...block, name: 'Another' })
    expect(other.status).toBe(422)
    expect(other.body.errors[0].code).toBe('idempotency.mismatch')
  })

  it('answers a repeat as it was then, whatever was drawn over it since', async () => {
    const first = buildBlock({ code: 'R1', geometry: squareAt(40) })
    const made = await post(first)
    await post(buildBlock({ code: 'R2', geometry: squareAt(40.1), acknowledged: [{ code: 'geometry.overlap', reason: 'Two tiers' }] })).expect(201)
    const repeat = await post(first)
    expect(repeat.status).toBe(200)
    expect(repeat.body).toEqual(made.body)
  })

  it('keeps a code for one block', async () => {
    const response = await post(buildBlock({ code: 'A1', geometry: squareAt(2) }))
    expect(response.status).toBe(409)
    expect(response.body.errors).toMatchObject([{ path: 'code', code: 'code.taken' }])
  })

  it('stores a clockwise ring with heights the right way round and flat', async () => {
    const { coordinates } = squareAt(3) as { coordinates: number[][][] }
    const clockwise = { type: 'Polygon', coordinates: [[...(coordinates[0] ?? [])].reverse().map(([lon, lat]) => [lon, lat, 250])] }
    const response = await post(buildBlock({ code: 'A3', geometry: clockwise }))
    expect(response.status).toBe(201)
    expect(response.body.geometry.coordinates[0][0]).toHaveLength(2)
    const same = buildBlock({ code: 'A4', geometry: squareAt(4) })
    expect(response.body.areaM2).toBeCloseTo((await post(same)).body.areaM2, 3)
  })
})

describe('an impossible boundary is refused with its reason', () => {
  it.each([
    { name: 'a bow-tie', geometry: ring([0, 0], [0.01, 0.01], [0.01, 0], [0, 0.01], [0, 0]), code: 'geometry.self_intersection' },
    { name: 'points on one line', geometry: ring([0, 0], [0.01, 0.01], [0.02, 0.02], [0, 0]), code: 'geometry.area_zero' },
    { name: 'latitude 91', geometry: ring([0, 91], [1, 91], [1, 90], [0, 91]), code: 'geometry.out_of_range' },
    { name: 'an open ring', geometry: ring([0, 0], [0.01, 0], [0.01, 0.01], [0, 0.01]), code: 'geometry.not_closed' },
    { name: 'two corners', geometry: ring([0, 0], [0.01, 0.01], [0, 0]), code: 'geometry.too_few_points' },
    { name: 'a point', geometry: { type: 'Point', coordinates: [0, 0] }, code: 'geometry.type' },
    { name: 'metres', geometry: ring([1113194, 6446275], [1113294, 6446275], [1113294, 6446375], [1113194, 6446275]), code: 'geometry.degrees_needed' },
    { name: '5,001 points', geometry: ring(...circle(5_001)), code: 'geometry.too_many_points' },
  ])('$name', async ({ geometry, code }) => {
    const before = await count()
    const response = await post({ ...buildBlock({ code: 'X' }), geometry })
    expect(response.status).toBe(422)
    expect(response.body.acknowledgeable).toBeUndefined()
    expect(response.body.errors.map((error: { code: string }) => error.code)).toContain(code)
    expect(response.body.detail).not.toContain('problems.')
    expect(await count()).toBe(before)
  })
})

describe('an unlikely boundary passes when acknowledged', () => {
  it('overlap with another block', async () => {
    const block = buildBlock({ code: 'O1', geometry: squareAt(0.2) })
    const doubted = await post(block)
    expect(doubted.status).toBe(422)
    expect(doubted.body).toMatchObject({ acknowledgeable: true, errors: [{ code: 'geometry.overlap', params: { code: 'A1' } }] })
    const passed = await post({ ...block, acknowledged: [{ code: 'geometry.overlap', reason: 'Two tiers of one slope' }] })
    expect(passed.status).toBe(201)
  })

  it('swapped axes and far away', async () => {
    const { coordinates } = squareAt(5) as { coordinates: number[][][] }
    const swapped = { type: 'Polygon', coordinates: [(coordinates[0] ?? []).map(([lon = 0, lat = 0]) => [lat, lon + 180])] }
    const far = buildBlock({ code: 'F1', geometry: swapped })
    const response = await post(far)
    expect(response.status).toBe(422)
    expect(response.body).toMatchObject({ acknowledgeable: true })
    expect(['geometry.far_from_farm', 'geometry.swapped']).toContain(response.body.errors[0].code)
  })
})

describe('outlines laced into each other', () => {
  it('are not clipped but asked about', async () => {
    const comb = buildBlock({ code: 'K1', geometry: combAt(60, false) })
    await post(comb).expect(201)
    const crossed = await post(buildBlock({ code: 'K2', geometry: combAt(60, true) }))
    expect(crossed).toMatchObject({ status: 422, body: { acknowledgeable: true, errors: [{ code: 'geometry.overlap_unknown', params: { code: 'K1' } }] } })
  })
})

/** A comb of a hundred teeth, upright or lying, over the same square. */
function combAt(place: number, lying: boolean): { type: 'Polygon'; coordinates: number[][][] } {
  const teeth = 100
  const tip: [number, number][] = Array.from({ length: teeth }, (_, index): [number, number][] => [[index / teeth, 1], [(index + 0.5) / teeth, 1], [(index + 0.5) / teeth, 0.1], [(index + 1) / teeth, 0.1]]).flat()
  const ring = [[0, 0], [1, 0], ...tip.reverse(), [0, 0]].map(([x = 0, y = 0]) => (lying ? [y, x] : [x, y]))
  const [west, south] = [-123.31 + place * 0.002, 44.61]
  return { type: 'Polygon', coordinates: [ring.map(([x = 0, y = 0]) => [Number((west + x * 0.001).toFixed(7)), Number((south + y * 0.001).toFixed(7))])] }
}

describe('what is sent is held against the contract', () => {
  it.each([
    { name: 'an unknown field', change: { areaM2: 5 }, code: 'unknown_field' },
    { name: 'a blank name', change: { name: ' \u200b ' }, code: 'text.required' },
    { name: 'a direction mark', change: { name: 'A\u202Eb' }, code: 'text.bidi_control' },
    { name: 'a NUL', change: { name: 'A\u0000b' }, code: 'text.control' },
    { name: 'a lone surrogate', change: { name: 'A\ud800' }, code: 'text.control' },
    { name: 'no geometry', change: { geometry: null }, code: 'field.type' },
  ])('$name', async ({ change, code }) => {
    const response = await post({ ...buildBlock({ code: 'Y', geometry: squareAt(7) }), ...change })
    expect(response.status).toBe(422)
    expect(response.body.errors[0].code).toBe(code)
  })

  it('keeps what looks like markup or code as plain text', async () => {
    const name = '<img src=x onerror=alert(1)> \'); drop table blocks;--'
    const response = await post(buildBlock({ code: 'M1', name, geometry: squareAt(8) }))
    expect(response.body.name).toBe(name)
  })
})

describe('the list', () => {
  it('goes on where a page ends, without gaps or repeats', async () => {
    const codes: string[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const page: { body: { items: { code: string }[]; next: string | null } } = await manager.get(`/api/farms/${farm.id}/blocks?limit=2${cursor ? `&cursor=${cursor}` : ''}`)
      codes.push(...page.body.items.map(({ code }) => code))
      cursor = page.body.next
    }
    expect(codes).toHaveLength(await count())
    expect(new Set(codes).size).toBe(codes.length)
  })

  it.each(['limit=1e9', 'limit=-1', 'limit=0', 'cursor=%7B%7D', 'cursor=WyJhIiwiYiJd', 'sort=password', 'limit=1&limit=2'])('refuses %s', async (query) => {
    expect((await manager.get(`/api/farms/${farm.id}/blocks?${query}`)).status).toBe(422)
  })
})

function circle(points: number): [number, number][] {
  const around = Array.from({ length: points }, (_, index): [number, number] => {
    const angle = (2 * Math.PI * index) / points
    return [Number((0.01 * Math.cos(angle)).toFixed(7)), Number((0.01 * Math.sin(angle)).toFixed(7))]
  })
  return [...around, around[0] ?? [0, 0]]
}
