import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lineText } from '../../../shared/contract/text.ts'
import { isInside } from '../../../src/components/map/ringsAtBox.ts'
import { judgeShapes, type ImportGround } from '../../../shared/importing/judgeShapes.ts'
import type { ImportOptions, ReadShape } from '../../../shared/importing/importTypes.ts'
import { proposeCodes } from '../../../shared/importing/proposeCodes.ts'
import { buildSquare } from '../geo/buildRing.ts'

const options: ImportOptions = { swap: false, close: false, toleranceM: 0, nameColumn: 'name', codeColumn: null, cropColumn: null }
const ground: ImportGround = { blocks: [], place: null }
const shape = (geometry: unknown, name = 'North'): ReadShape => ({ geometry, properties: { name }, refusal: null })
const square = (lon: number, side?: number) => ({ type: 'Polygon', coordinates: [buildSquare(lon, 45, side)] })
const judge = (geometry: unknown, change: Partial<ImportOptions> = {}, on = ground) => judgeShapes({ shapes: [shape(geometry)] }, { ...options, ...change }, on)[0]
const refusalOf = (geometry: unknown, change?: Partial<ImportOptions>) => judge(geometry, change)?.refusals[0]?.id

describe('what cannot become a block', () => {
  const open = { type: 'Polygon', coordinates: [buildSquare(10, 45).slice(0, -1)] }
  const line = { type: 'LineString', coordinates: buildSquare(10, 45).slice(0, -1) }

  it.each([
    { name: 'nothing', geometry: null, id: 'importing.refused.empty' },
    { name: 'a point', geometry: { type: 'Point', coordinates: [10, 45] }, id: 'importing.refused.point' },
    { name: 'a line', geometry: line, id: 'importing.refused.line' },
    { name: 'an open ring', geometry: open, id: 'problems.geometry.not_closed' },
    { name: 'a circle', geometry: { type: 'Circle' }, id: 'importing.refused.type' },
    { name: 'a collection in itself, a thousand deep', geometry: nest(3_000), id: 'importing.refused.empty' },
    { name: 'metres', geometry: { type: 'Polygon', coordinates: [[[495_000, 4_938_000], [495_100, 4_938_000], [495_100, 4_938_100], [495_000, 4_938_000]]] }, id: 'problems.geometry.degrees_needed' },
    { name: 'words for figures', geometry: { type: 'Polygon', coordinates: [[['10', '45'], [11, 45], [11, 46], ['10', '45']]] }, id: 'problems.geometry.coordinates' },
    { name: '5,002 points', geometry: { type: 'Polygon', coordinates: [circle(5_001)] }, id: 'problems.geometry.too_many_points' },
  ])('$name', ({ geometry, id }) => { expect(refusalOf(geometry)).toBe(id) })

  it('lines and open rings are closed by the person’s word alone, and it is said', () => {
    for (const geometry of [open, line]) {
      const closed = judge(geometry, { close: true })
      expect(closed?.geometry).toEqual(judge(square(10))?.geometry)
      expect(closed?.notes.map(({ id }) => id)).toEqual(['importing.note.closed'])
    }
    expect(judge(square(10), { close: true })?.notes).toEqual([])
  })

  it('as many are judged as there are, in their order', () => {
    fc.assert(fc.property(fc.array(fc.anything(), { maxLength: 30 }), fc.boolean(), fc.boolean(), (geometries, swap, close) => {
      const candidates = judgeShapes({ shapes: geometries.map((geometry) => shape(geometry)) }, { ...options, swap, close, toleranceM: 1 }, ground)
      expect(candidates.map(({ number }) => number)).toEqual(geometries.map((_, index) => index + 1))
      for (const { geometry, refusals } of candidates) expect(geometry === null).toBe(refusals.length > 0)
    }))
  })
})

describe('several polygons of one placemark', () => {
  it('are parts of one block; what lies beside them is counted', () => {
    const collection = { type: 'GeometryCollection', geometries: [square(10), square(11), { type: 'Point', coordinates: [10, 45] }] }
    const found = judge(collection)
    expect(found?.geometry).toMatchObject({ type: 'MultiPolygon', coordinates: [expect.any(Array), expect.any(Array)] })
    expect(found?.notes).toEqual([{ id: 'importing.note.left', params: { count: 1 } }])
  })
})

describe('latitude and longitude the wrong way round', () => {
  const swapped = { type: 'Polygon', coordinates: [buildSquare(10, 45).map(([lon, lat]) => [lat, lon])] }
  const on: ImportGround = { blocks: [], place: [10, 45] }

  it('is noticed beside the farm, and put right by the person’s word', () => {
    expect(judge(swapped, {}, on)?.cautions.map(({ code }) => code)).toEqual(['geometry.swapped'])
    const turned = judge(swapped, { swap: true }, on)
    expect(turned?.geometry).toEqual(judge(square(10))?.geometry)
    expect(turned?.cautions).toEqual([])
  })
})

describe('what is there already', () => {
  const north = judge(square(10))?.geometry
  if (north === undefined || north === null) throw new RangeError('a square is a boundary')
  const on: ImportGround = { blocks: [{ id: 'a', code: 'A1', name: 'North', geometry: north }], place: null }
  const first = (geometry: unknown, name: string) => judgeShapes({ shapes: [shape(geometry, name)] }, options, on)[0]

  it('the same ground, the same name, ground in part', () => {
    expect(first(square(10), 'Else')).toMatchObject({ twin: { id: 'importing.twin.ground', params: { code: 'A1' } }, cautions: [{ code: 'geometry.overlap' }] })
    expect(first(square(10.01), 'NORTH')).toMatchObject({ twin: { id: 'importing.twin.name', params: { code: 'A1' } }, cautions: [] })
    expect(first(square(10.0005), 'Else')).toMatchObject({ twin: null, cautions: [{ code: 'geometry.overlap', message: { params: { code: 'A1' } } }] })
    expect(first(square(10.01), 'Else')).toMatchObject({ twin: null, cautions: [] })
  })

  it('a small one in a large one is no twin of it', () => {
    expect(first(square(10.0002, 0.0003), 'Else')).toMatchObject({ twin: null, cautions: [{ code: 'geometry.overlap' }] })
  })

  it('a shape twice in the file', () => {
    const [one, two] = judgeShapes({ shapes: [shape(square(20), 'One'), shape(square(20), 'Two')] }, options, ground)
    expect(one).toMatchObject({ twin: null, cautions: [] })
    expect(two?.twin).toEqual({ id: 'importing.twin.ground', params: { code: 'One' } })
  })
})

describe('thinning', () => {
  it('leaves out points within the tolerance, moves none of the rest, and says how many', () => {
    const fine = { type: 'Polygon', coordinates: [circle(6_000)] }
    const kept = judge(fine, { toleranceM: 1 })
    expect(kept?.points).toBeLessThan(400)
    expect(kept?.notes).toEqual([{ id: 'importing.note.thinned', params: { points: kept?.points, from: 6_001 } }])
    const original = new Set(circle(6_000).map(([lon = 0, lat = 0]) => `${lon.toFixed(7)},${lat.toFixed(7)}`))
    const ring = (kept?.geometry?.coordinates[0] ?? []) as [number, number][]
    expect(ring.every(([lon, lat]) => original.has(`${lon.toFixed(7)},${lat.toFixed(7)}`))).toBe(true)
    // 500 m round: a line that moves by at most 1 m encloses at most 0.4 % less.
    expect(kept?.areaM2).toBeGreaterThan(Math.PI * 500 ** 2 * 0.995)
    expect(isInside([ring], [10, 45])).toBe(true)
  })

  it('leaves coarse outlines and flat rings alone', () => {
    expect(judge(square(10), { toleranceM: 5 })?.points).toBe(5)
    const flat = { type: 'Polygon', coordinates: [Array.from({ length: 1_000 }, (_, index) => [10 + index / 1e6, 45]).concat([[10, 45]])] }
    expect(refusalOf(flat, { toleranceM: 1 })).toBe('problems.geometry.area_zero')
  })
})

describe('codes', () => {
  it.each([
    { wanted: ['A1', 'A1', 'A1'], taken: [], codes: ['A1', 'A1-2', 'A1-3'] },
    { wanted: ['A1'], taken: ['A1', 'A1-2'], codes: ['A1-3'] },
    { wanted: ['Long bank by the stream'], taken: [], codes: ['Long bank by'] },
    { wanted: ['Grossbachwiesenhang'], taken: ['Grossbachwie'], codes: ['Grossbachw-2'] },
    { wanted: ['', ''], taken: [], codes: ['1', '2'] },
  ])('$wanted', ({ wanted, taken, codes }) => { expect(proposeCodes(wanted, taken)).toEqual(codes) })

  it('are never alike, never taken, never longer than there is room', () => {
    fc.assert(fc.property(fc.array(fc.string({ unit: 'grapheme', maxLength: 20 }), { maxLength: 40 }), fc.array(fc.string({ maxLength: 12 })), (wanted, taken) => {
      const codes = proposeCodes(wanted, taken)
      const all = (list: string[]) => list.map((code) => code.toLowerCase())
      expect(new Set(all([...codes, ...taken])).size).toBe(codes.length + new Set(all(taken)).size)
      for (const code of codes) expect(lineText(12).safeParse(code)).toEqual({ success: true, data: code })
    }))
  })
})

function circle(count: number): number[][] {
  const around = Array.from({ length: count }, (_, index) => {
    const angle = (2 * Math.PI * index) / count
    return [10 + (500 / 78_847) * Math.cos(angle), 45 + (500 / 111_132) * Math.sin(angle)]
  })
  return [...around, around[0] ?? []]
}

function nest(depth: number): unknown {
  let geometry: unknown = { type: 'GeometryCollection', geometries: [] }
  for (let each = 0; each < depth; each += 1) geometry = { type: 'GeometryCollection', geometries: [geometry] }
  return geometry
}
