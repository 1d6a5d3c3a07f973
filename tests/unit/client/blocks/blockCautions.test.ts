import { describe, expect, it } from 'vitest'
import type { Boundary, Position } from '../../../../shared/geo/geometryTypes.ts'
import { renderMessage } from '../../../../shared/messages/renderMessage.ts'
import { cautionsOf, findCautions } from '../../../../src/composables/block/blockCautions.ts'
import { outlineWords } from '../../../../src/composables/block/outlineWords.ts'

const FARM: Position = [-123.31, 44.6]
function square(lon: number, lat: number, side = 0.001): Boundary {
  return { type: 'Polygon', coordinates: [[[lon, lat], [lon + side, lat], [lon + side, lat + side], [lon, lat + side], [lon, lat]]] }
}
const words = (geometry: Boundary, others: Parameters<typeof findCautions>[1], place: Position | null = FARM): string[] =>
  findCautions(geometry, others, place).flatMap(({ sentences }) =>
    sentences.map((each) => (typeof each === 'string' ? each : renderMessage('en', each))),
  )

describe('findCautions', () => {
  it('finds nothing beside the other blocks', () => {
    expect(findCautions(square(-123.31, 44.6), [{ id: '1', code: 'A1', geometry: square(-123.3, 44.6) }], FARM)).toEqual([])
  })

  it('names the block under it and how much of it', () => {
    const found = words(square(-123.31, 44.6), [{ id: '1', code: 'A1', geometry: square(-123.3095, 44.6) }])
    expect(found).toEqual(['0.44 ha of it lie inside A1.'])
  })

  it('passes over the width of a pen', () => {
    const sliver = square(-123.31 + 0.00098, 44.6)
    expect(findCautions(square(-123.31, 44.6), [{ id: '1', code: 'A1', geometry: sliver }], FARM)).toEqual([])
  })

  it('asks whether a far one is meant, and whether its axes are exchanged', () => {
    expect(findCautions(square(-121, 44.6), [], FARM)[0]?.code).toBe('geometry.far_from_farm')
    const [exchanged] = findCautions(square(36.6, 5), [], [5, 36.6])
    expect(exchanged?.code).toBe('geometry.swapped')
  })

  it('knows no distance before the first block', () => {
    expect(findCautions(square(20, 20), [], null)).toEqual([])
  })
})

describe('cautionsOf', () => {
  const problem = {
    type: 'about:blank', title: 'Unlikely', status: 422, code: 'unlikely', detail: '', requestId: 'r',
    errors: [
      { path: 'geometry', code: 'geometry.overlap', message: 'On A1.' },
      { path: 'geometry', code: 'geometry.overlap', message: 'On A2.' },
    ],
  }
  it('gathers what one reason answers', () => {
    expect(cautionsOf({ ...problem, acknowledgeable: true })).toEqual([{ code: 'geometry.overlap', sentences: ['On A1.', 'On A2.'] }])
  })
  it('is empty for what cannot be acknowledged', () => {
    expect(cautionsOf(problem)).toEqual([])
  })
})

describe('outlineWords', () => {
  it.each([
    [{ code: 'geometry.self_intersection', params: { lon: 1, lat: 2, edgeA: 1, edgeB: 3 } }, 'Edge 1 crosses edge 3. Take a corner back, or go round another way.'],
    [{ code: 'geometry.area_range', params: { areaM2: 0.5, minM2: 1, maxHa: 50_000 } }, 'A block is between 1 m² and 50 000 ha.'],
    [{ code: 'geometry.never_heard_of', params: {} }, 'An outline like this cannot be kept.'],
  ])('says %o', (finding, sentence) => {
    expect(outlineWords('en', finding)).toBe(sentence)
  })
  it('speaks Spanish', () => {
    expect(outlineWords('es', { code: 'geometry.self_intersection', params: { edgeA: 2, edgeB: 4 } })).toMatch(/^El lado 2 cruza el lado 4\./)
  })
})
