import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { shallowRef } from 'vue'
import type { Position } from '../../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../../shared/geo/measurePolygon.ts'
import { movePosition } from '../../../../shared/geo/movePosition.ts'
import { cornersOfShape, countPoints, emptyShape, judgeShape, type Shape } from '../../../../src/composables/block/shape.ts'
import { crossingEdges } from '../../../../src/composables/block/outlineWords.ts'
import { useShape, type ShapeWork } from '../../../../src/composables/block/useShape.ts'

const A: Position = [-123.312, 44.606]
const B: Position = [-123.31, 44.606]
const C: Position = [-123.31, 44.605]
const D: Position = [-123.312, 44.605]
const square = (): Shape => ({ parts: [[[D, C, B, A]]], open: null })
const first = { part: 0, ring: 0, corner: 0 }

function begin(shape: Shape = square()) {
  const content = shallowRef({ shape })
  return { content, work: useShape(content) }
}
const areaOf = ({ measure }: ShapeWork): number => measure.value?.areaM2 ?? 0

describe('useShape', () => {
  it('draws a ring, closes it, and goes back over every corner', () => {
    const { content, work } = begin({ ...emptyShape(), open: { as: 'part', points: [] } })
    for (const corner of [A, B]) work.add(corner)
    expect(work.finish()).toBe(false)
    for (const corner of [C, D, D]) work.add(corner)
    expect(work.finish()).toBe(true)
    expect(content.value.shape.open).toBeNull()
    expect(countPoints(content.value.shape)).toBe(4)
    for (let step = 0; step < 5; step += 1) work.undo()
    expect(content.value.shape).toEqual({ parts: [], open: { as: 'part', points: [] } })
    expect(work.canUndo.value).toBe(false)
  })

  it('cuts a hole, whose ground is gone while it is drawn', () => {
    const { content, work } = begin()
    const wholeM2 = areaOf(work)
    work.open('hole')
    for (const corner of [[-123.3115, 44.6055], [-123.311, 44.6055], [-123.311, 44.6052]] as Position[]) work.add(corner)
    expect(areaOf(work)).toBeLessThan(wholeM2)
    expect(work.finish()).toBe(true)
    expect(content.value.shape.parts[0]).toHaveLength(2)
  })

  it('refuses a hole outside, in words of the finding, and leaves it without loss', () => {
    const { content, work } = begin()
    work.open('hole')
    for (const corner of [[-123.32, 44.6], [-123.32, 44.601], [-123.321, 44.601]] as Position[]) work.add(corner)
    expect(work.findings.value[0]?.code).toBe('geometry.hole_outside')
    expect(work.finish()).toBe(false)
    work.leave()
    expect(content.value.shape).toEqual(square())
    work.undo()
    expect(content.value.shape.open?.points).toHaveLength(3)
  })

  it('takes up the corner under the cross, carries it, and drops it, in one step back', () => {
    const { content, work } = begin()
    work.moveCross(movePosition(D, 3, 0))
    expect(work.pick(5)).toBe('held')
    work.moveCross(movePosition(D, 20, 0))
    work.moveCross(movePosition(D, 30, 0))
    expect(work.pick(5)).toBe('dropped')
    expect(cornersOfShape(content.value.shape)[0]?.position[0]).toBeCloseTo(movePosition(D, 30, 0)[0], 7)
    work.moveCross(A)
    expect(cornersOfShape(content.value.shape)[0]?.position[0]).toBeCloseTo(movePosition(D, 30, 0)[0], 7)
    work.undo()
    expect(content.value.shape.parts).toEqual(square().parts)
  })

  it('sets a corner into the edge under the cross, and finds nothing elsewhere', () => {
    const { content, work } = begin()
    work.moveCross([-123.311, 44.605])
    expect(work.pick(5)).toBe('added')
    expect(countPoints(content.value.shape)).toBe(5)
    expect(work.chosen.value).toEqual({ ...first, corner: 1 })
    work.pick(5)
    work.moveCross([-123.311, 44.6055])
    expect(work.pick(5)).toBe('nothing')
  })

  it('a drag is one step, however often the hand moved', () => {
    const { content, work } = begin()
    work.drag(first, [-123.313, 44.605], true)
    for (let moved = 0; moved < 9; moved += 1) work.drag(first, [-123.313 - moved * 1e-4, 44.605], false)
    work.undo()
    expect(content.value.shape.parts).toEqual(square().parts)
    expect(work.canUndo.value).toBe(false)
  })

  it('moves by metres, removes, and lets go of what is gone', () => {
    const { content, work } = begin()
    work.moveBy(first, 0, -10)
    expect(cornersOfShape(content.value.shape)[0]?.position[1]).toBeCloseTo(movePosition(D, 0, -10)[1], 7)
    work.chosen.value = first
    work.remove(first)
    expect(countPoints(content.value.shape)).toBe(3)
    expect(work.chosen.value).toBeNull()
    work.remove(first)
    expect(countPoints(content.value.shape)).toBe(3)
  })

  it('any sequence taken back is what was before', () => {
    const corner = fc.nat(4).map((number) => ({ ...first, corner: number }))
    const metres = fc.integer({ min: -30, max: 30 })
    const act = fc.oneof(
      fc.record({ do: fc.constant('move' as const), at: corner, x: metres, y: metres }),
      fc.record({ do: fc.constant('insert' as const), at: corner, x: metres, y: metres }),
      fc.record({ do: fc.constant('remove' as const), at: corner, x: metres, y: metres }),
      fc.record({ do: fc.constant('all' as const), at: corner, x: metres, y: metres }),
      fc.record({ do: fc.constant('hole' as const), at: corner, x: metres, y: metres }),
    )
    fc.assert(fc.property(fc.array(act, { maxLength: 12 }), (acts) => {
      const { content, work } = begin()
      for (const { do: what, at, x, y } of acts) {
        if (what === 'move') work.moveBy(at, x, y)
        else if (what === 'insert') work.insert(at, movePosition(A, x, y))
        else if (what === 'remove') work.remove(at)
        else if (what === 'all') work.moveAll(x, y)
        else {
          work.open('hole')
          for (const [east, north] of [[0, 0], [10, 0], [5, 8]] as const) work.add(movePosition([-123.311, 44.6055], east + x, north + y))
          work.finish()
        }
      }
      const after = content.value.shape
      while (work.canUndo.value) work.undo()
      expect(content.value.shape).toEqual(square())
      while (work.canRedo.value) work.redo()
      expect(content.value.shape).toEqual(after)
    }), { seed: 20_261_201, numRuns: 200 })
  })
})

describe('a ring being set', () => {
  const drawn = (points: Position[] = []) => begin({ ...emptyShape(), open: { as: 'part', points } })
  const points = ({ content }: ReturnType<typeof begin>): Position[] => content.value.shape.open?.points ?? []

  it('measures nothing under three corners, and while corners are added', () => {
    const { work } = drawn([A, B])
    expect([work.geometry.value, work.measure.value, work.findings.value]).toEqual([null, null, []])
    for (const corner of [C, D]) work.add(corner)
    // 2/1000° × 1/1000° at 44.6°: 158.7 m by 111.1 m, worked out with the radii of curvature of WGS84.
    expect(areaOf(work)).toBeGreaterThan(17_600)
    expect(areaOf(work)).toBeLessThan(17_700)
    expect(work.measure.value?.perimeterM).toBeCloseTo(2 * (158.73 + 111.11), 0)
  })

  it('takes a double touch once', () => {
    const made = drawn()
    made.work.add(A)
    made.work.add([A[0] + 1e-7, A[1]])
    expect(points(made)).toEqual([A])
  })

  it('goes back and forth', () => {
    const made = drawn()
    const { work } = made
    work.add(A)
    work.add(B)
    work.removeLast()
    expect(points(made)).toEqual([A])
    work.undo()
    expect(points(made)).toEqual([A, B])
    work.undo()
    work.redo()
    expect(points(made)).toEqual([A, B])
    work.undo()
    work.add(C)
    expect(work.canRedo.value).toBe(false)
  })

  it('takes no corner once it is closed, until that is undone', () => {
    const { content, work } = drawn([A, B, C])
    expect(work.finish()).toBe(true)
    work.add(D)
    expect(countPoints(content.value.shape)).toBe(3)
    work.undo()
    work.add(D)
    expect(content.value.shape.open?.points).toEqual([A, B, C, D])
  })

  it('drops a last corner on the first', () => {
    const { content, work } = drawn([A, B, C, D, A])
    expect(work.finish()).toBe(true)
    expect(countPoints(content.value.shape)).toBe(4)
  })

  it('names the two edges that cross, and is not closed like that', () => {
    const { work } = drawn([A, C, B, D])
    expect(work.geometry.value).toBeNull()
    expect(work.findings.value[0]?.code).toBe('geometry.self_intersection')
    expect(crossingEdges(work.findings.value)).toEqual([0, 2])
    expect(work.finish()).toBe(false)
  })
})

describe('a typed ring', () => {
  it('is open under three points, closed from there, and one step however it was typed', () => {
    const { content, work } = begin({ ...emptyShape(), open: { as: 'part', points: [] } })
    work.typeRing([A, B])
    expect(content.value.shape).toEqual({ parts: [], open: { as: 'part', points: [A, B] } })
    work.typeRing([A, B, C])
    work.typeRing([A, B, C, D])
    expect(content.value.shape).toEqual({ parts: [[[A, B, C, D]]], open: null })
    work.undo()
    expect(countPoints(content.value.shape)).toBe(0)
  })

  it('keeps holes and other parts, and waits for a third point while there are some', () => {
    const hole: Position[] = [[-123.3115, 44.6055], [-123.311, 44.6055], [-123.311, 44.6052]]
    const { content, work } = begin({ parts: [[[D, C, B, A], hole]], open: null })
    work.typeRing([D, C])
    expect(content.value.shape.parts[0]?.[0]).toHaveLength(4)
    work.typeRing([D, C, A])
    expect(content.value.shape.parts).toEqual([[[D, C, A], hole]])
  })
})

describe('judgeShape', () => {
  it('measures what would be stored', () => {
    const { geometry } = judgeShape(square())
    // 2/1000° × 1/1000° at 44.6°: 158.7 m by 111.1 m, worked out with the radii of curvature of WGS84.
    expect(geometry && measurePolygon(geometry).areaM2).toBeGreaterThan(17_600)
    expect(judgeShape(emptyShape())).toEqual({ geometry: null, findings: [] })
  })
})
