import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildBlock, squareAt } from '../../server/demo/buildThings.ts'
import { openHouse, type Agent, type TestFarm, type TestHouse } from '../support/openHouse.ts'
import { expectRefused, stateOf } from '../support/sendBad.ts'

/** Boundaries that nobody can farm, and those that look so; rows of the catalogue of bad input, section geometry. */
let house: TestHouse
let farm: TestFarm
let manager: Agent

beforeAll(async () => {
  house = await openHouse()
  farm = await house.makeFarm()
  manager = await house.as(farm.accounts.manager)
  await manager.post(`/api/farms/${farm.id}/blocks`).send(buildBlock()).expect(201)
})
afterAll(() => house.close())

const polygon = (...rings: number[][][]) => ({ type: 'Polygon', coordinates: rings })
const box = (west: number, south: number, width: number, height = width) =>
  [[west, south], [west + width, south], [west + width, south + height], [west, south + height], [west, south]]
const block = (geometry: unknown) => () => ({ ...buildBlock({ code: 'NEW' }), geometry })
const [W, S] = [-123.2, 44.6]

describe('what is impossible is refused, with its place, and nothing is stored', () => {
  it.each([
    { what: 'B-01 a bow-tie', geometry: polygon([[W, S], [W + 0.01, S + 0.01], [W + 0.01, S], [W, S + 0.01], [W, S]]), errors: ['geometry.coordinates.0 geometry.self_intersection'] },
    { what: 'B-02 one point four times', geometry: polygon([[W, S], [W, S], [W, S], [W, S]]), errors: ['geometry.coordinates.0 geometry.area_zero'] },
    { what: 'B-02 points on one line', geometry: polygon([[W, S], [W + 0.01, S], [W + 0.02, S], [W, S]]), errors: ['geometry.coordinates.0 geometry.area_zero'] },
    { what: 'B-03 half a square metre', geometry: polygon(box(W, S, 0.000009, 0.0000063)), errors: ['geometry geometry.area_range'] },
    { what: 'B-03 80,000 ha', geometry: polygon(box(W, S, 0.36, 0.255)), errors: ['geometry geometry.area_range'] },
    { what: 'B-05 latitude 91', geometry: polygon(box(W, 90.5, 0.5)), errors: ['geometry.coordinates.0.2 geometry.out_of_range'] },
    { what: 'B-05 longitude −181', geometry: polygon(box(-181, S, 0.01)), errors: ['geometry.coordinates.0.0 geometry.out_of_range'] },
    { what: 'B-06 a ring across 180°', geometry: polygon([[179.99, -17], [-179.99, -17], [-179.99, -16.99], [179.99, -16.99], [179.99, -17]]), errors: ['geometry.coordinates.0 geometry.crosses_antimeridian'] },
    { what: 'B-07 an open ring', geometry: polygon(box(W, S, 0.001).slice(0, 4)), errors: ['geometry.coordinates.0 geometry.not_closed'] },
    { what: 'B-08 three positions', geometry: polygon([[W, S], [W + 0.01, S], [W, S]]), errors: ['geometry.coordinates.0 geometry.too_few_points'] },
    { what: 'B-10 a hole outside', geometry: polygon(box(W, S, 0.002), box(W + 0.01, S, 0.001)), errors: ['geometry.coordinates.1 geometry.hole_outside'] },
    { what: 'B-10 a hole across the shell', geometry: polygon(box(W, S, 0.002), box(W + 0.001, S + 0.0005, 0.002, 0.001)), errors: ['geometry.coordinates.1 geometry.hole_outside'] },
    { what: 'B-13 a point', geometry: { type: 'Point', coordinates: [W, S] }, errors: ['geometry geometry.type'] },
    { what: 'B-13 a collection', geometry: { type: 'GeometryCollection', geometries: [] }, errors: ['geometry geometry.type'] },
    { what: 'B-13 nothing', geometry: null, errors: ['geometry field.type'] },
    { what: 'B-15 projected metres', geometry: polygon([[1113194, 6446275], [1113294, 6446275], [1113294, 6446375], [1113194, 6446275]]), errors: ['geometry.coordinates.0.2 geometry.degrees_needed'] },
    { what: 'B-15 a crs member', geometry: { ...polygon(box(W, S, 0.001)), crs: { type: 'name', properties: { name: 'EPSG:3857' } } }, errors: ['geometry geometry.crs'] },
    { what: 'B-19 a spike', geometry: polygon([[W, S], [W + 0.002, S], [W + 0.002, S + 0.001], [W + 0.002, S + 0.002], [W + 0.002, S + 0.001], [W, S + 0.001], [W, S]]), errors: ['geometry.coordinates.0 geometry.spike'] },
  ])('$what', async ({ what, geometry, errors }) => {
    await expectRefused(house, farm, manager, { what, path: '/blocks', body: block(geometry), errors })
  })

  it('B-01 names the crossing point', async () => {
    const bowTie = polygon([[W, S], [W + 0.01, S + 0.01], [W + 0.01, S], [W, S + 0.01], [W, S]])
    const { body } = await manager.post(`/api/farms/${farm.id}/blocks`).send(block(bowTie)()).expect(422)
    expect(body.errors[0].params).toMatchObject({ lon: -123.195, lat: 44.605 })
  })

  it('B-11 more points than a block can have, and more than anybody may send', async () => {
    const ringOf = (count: number) => Array.from({ length: count }, (_, index) => [W + 0.001 * Math.cos((index / count) * 2 * Math.PI), S + 0.001 * Math.sin((index / count) * 2 * Math.PI)])
    const before = await stateOf(house, farm.id)
    const many = await manager.post(`/api/farms/${farm.id}/blocks`).send(block(polygon(ringOf(5_001)))()).expect(422)
    expect(many.body.errors[0].code).toBe('geometry.too_many_points')
    const flood = await manager.post(`/api/farms/${farm.id}/blocks`).send(block(polygon(ringOf(60_000)))()).expect(413)
    expect(flood.body.code).toBe('too_large')
    expect(await stateOf(house, farm.id)).toEqual(before)
  })

  it('B-12 lists inside each other 200,000 deep', async () => {
    const text = JSON.stringify(block(null)()).replace('"geometry":null', `"geometry":{"type":"Polygon","coordinates":${'['.repeat(200_000)}${']'.repeat(200_000)}}`)
    const { body } = await manager.post(`/api/farms/${farm.id}/blocks`).set('Content-Type', 'application/json').send(text).expect(400)
    expect(body.code).toBe('json_too_deep')
  })

  it.each(['application/zip', 'application/vnd.google-earth.kmz', 'application/vnd.google-earth.kml+xml'])('B-16, B-17 a file of type %s is not read', async (type) => {
    await manager.post(`/api/farms/${farm.id}/blocks`).set('Content-Type', type).send('PK').expect(415)
  })
})

describe('what is unlikely is asked about, and passes with a reason', () => {
  it.each([
    { what: 'B-04 exchanged axes in range', geometry: polygon([[44.61, -80], [44.611, -80], [44.611, -79.999], [44.61, -80]]), code: 'geometry.far_from_farm' },
    { what: 'B-20 over another block', geometry: squareAt(0.1), code: 'geometry.overlap' },
  ])('$what', async ({ geometry, code }) => {
    const body = { ...buildBlock({ code: code.slice(9, 17) }), geometry }
    const asked = await manager.post(`/api/farms/${farm.id}/blocks`).send(body)
    expect(asked.body).toMatchObject({ status: 422, acknowledgeable: true, errors: [{ code }] })
    await manager.post(`/api/farms/${farm.id}/blocks`).send({ ...body, acknowledged: [{ code, reason: 'It is so.' }] }).expect(201)
  })

  it('B-04 says that axes look exchanged where that would bring it home', async () => {
    const east = await house.makeFarm({ zone: 'Europe/Madrid' })
    const agent = await house.as(east.accounts.manager)
    await agent.post(`/api/farms/${east.id}/blocks`).send({ ...buildBlock(), geometry: polygon(box(-3.7, 40.4, 0.001)) }).expect(201)
    const { body } = await agent.post(`/api/farms/${east.id}/blocks`).send(block(polygon(box(40.402, -3.7, 0.001)))()).expect(422)
    expect(body).toMatchObject({ acknowledgeable: true, errors: [{ code: 'geometry.swapped' }] })
  })
})

describe('what is only untidy is taken', () => {
  it('B-06 a MultiPolygon cut at 180°', async () => {
    const fiji = await house.makeFarm({ zone: 'Pacific/Fiji' })
    const agent = await house.as(fiji.accounts.manager)
    const cut = { type: 'MultiPolygon', coordinates: [[box(179.99, -17, 0.01)], [box(-180, -17, 0.01)]] }
    const { status } = await agent.post(`/api/farms/${fiji.id}/blocks`).send(block(cut)())
    expect(status).toBe(201)
  })

  it('B-09, B-14, B-19 clockwise, with heights, with points repeated', async () => {
    const ring = box(W, S, 0.002).reverse().flatMap(([lon, lat]) => [[lon, lat, 70, 1], [lon, lat, 70, 1]])
    const { body } = await manager.post(`/api/farms/${farm.id}/blocks`).send({ ...buildBlock({ code: 'TIDY' }), geometry: polygon(ring as number[][]) }).expect(201)
    expect(body.areaM2).toBeGreaterThan(30_000)
    expect(body.geometry.coordinates).toEqual([[[-123.2, 44.6], [-123.198, 44.6], [-123.198, 44.602], [-123.2, 44.602], [-123.2, 44.6]]])
  })
})
