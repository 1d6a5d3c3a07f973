import { effectScope, nextTick } from 'vue'
import { describe, expect, it } from 'vitest'
import type { PlaceGeometry, Position } from '../../../../shared/geo/geometryTypes.ts'
import { usePlaceDrawing, type PlaceDrawing, type PlaceShape } from '../../../../src/composables/block/usePlaceDrawing.ts'

const A: Position = [-123.312, 44.606]
const B: Position = [-123.31, 44.606]
const C: Position = [-123.31, 44.605]

function begin(shape: PlaceShape, geometry: PlaceGeometry | null = null): PlaceDrawing {
  const drawing = effectScope().run(() => usePlaceDrawing({ geometry, shape }, () => 'en'))
  if (drawing === undefined) throw new TypeError('The drawing did not open')
  return drawing
}

describe('something on the ground in the making', () => {
  it('is one point, and the next one set takes its place', () => {
    const drawing = begin('point')
    expect(drawing.geometry.value).toBeNull()
    drawing.add(A)
    drawing.add(B)
    expect(drawing.geometry.value).toEqual({ type: 'Point', coordinates: B })
    drawing.undo()
    expect(drawing.geometry.value).toEqual({ type: 'Point', coordinates: A })
    drawing.redo()
    expect(drawing.geometry.value).toEqual({ type: 'Point', coordinates: B })
  })

  it('is a line of two points at least, without a double touch', () => {
    const drawing = begin('line')
    drawing.add(A)
    drawing.add([A[0] + 1e-7, A[1]])
    expect([drawing.points.value.length, drawing.geometry.value, drawing.findings.value]).toEqual([1, null, []])
    drawing.add(B)
    drawing.add(C)
    drawing.removeLast()
    expect(drawing.geometry.value).toEqual({ type: 'LineString', coordinates: [A, B] })
  })

  it('is an outline that closes by itself, and says where it crosses itself', () => {
    const drawing = begin('area')
    for (const corner of [A, B, C]) drawing.add(corner)
    expect(drawing.geometry.value?.type).toBe('Polygon')
    drawing.add([-123.311, 44.607])
    expect([drawing.geometry.value, drawing.findings.value[0]?.code]).toEqual([null, 'geometry.self_intersection'])
  })

  it('is typed as well as drawn, and what was drawn can be read as points', async () => {
    const drawing = begin('line')
    drawing.add(A)
    drawing.setBy('points')
    expect(drawing.text.value).toContain('44.606')
    drawing.text.value = '44.606, -123.312\n44.606, -123.31'
    await nextTick()
    expect(drawing.geometry.value).toEqual({ type: 'LineString', coordinates: [A, B] })
  })

  it('keeps every decimal and hole of what nobody touched', () => {
    const hole: Position[] = [[0.2, 0.2], [0.4, 0.2], [0.4, 0.4], [0.2, 0.2]]
    const pond: PlaceGeometry = { type: 'Polygon', coordinates: [[[0, 0], [1, 0], [1, 1], [0, 0]], hole] }
    expect(begin('area', pond).geometry.value).toBe(pond)
  })
})
