import { describe, expect, it } from 'vitest'
import { shallowRef } from 'vue'
import type { Position } from '../../../../shared/geo/geometryTypes.ts'
import { emptyBlockDraft, isBlockDraftBegun, outlineOf } from '../../../../src/composables/blockDraftContent.ts'
import { crossingEdges } from '../../../../src/composables/outlineWords.ts'
import { useOutline } from '../../../../src/composables/useOutline.ts'

const A: Position = [-123.312, 44.606]
const B: Position = [-123.31, 44.606]
const C: Position = [-123.31, 44.605]
const D: Position = [-123.312, 44.605]

function begin(points: Position[] = []) {
  const content = shallowRef({ ...emptyBlockDraft('draw'), points })
  return { content, outline: useOutline(content) }
}

describe('useOutline', () => {
  it('measures nothing under three corners', () => {
    const { outline } = begin([A, B])
    expect(outline.geometry.value).toBeNull()
    expect(outline.measure.value).toBeNull()
    expect(outline.findings.value).toEqual([])
  })

  it('measures while corners are added', () => {
    const { outline } = begin()
    for (const corner of [A, B, C, D]) outline.add(corner)
    // 2/1000° × 1/1000° at 44.6°: 158.7 m by 111.1 m, worked out with the radii of curvature of WGS84.
    expect(outline.measure.value?.areaM2).toBeGreaterThan(17_600)
    expect(outline.measure.value?.areaM2).toBeLessThan(17_700)
    expect(outline.measure.value?.perimeterM).toBeCloseTo(2 * (158.73 + 111.11), 0)
  })

  it('takes a double touch once', () => {
    const { content, outline } = begin()
    outline.add(A)
    outline.add([A[0] + 1e-7, A[1]])
    expect(content.value.points).toEqual([A])
  })

  it('goes back and forth', () => {
    const { content, outline } = begin()
    outline.add(A)
    outline.add(B)
    outline.removeLast()
    expect(content.value.points).toEqual([A])
    outline.undo()
    expect(content.value.points).toEqual([A, B])
    outline.undo()
    outline.redo()
    expect(content.value.points).toEqual([A, B])
    outline.undo()
    outline.add(C)
    expect(outline.canRedo.value).toBe(false)
  })

  it('finishes from three corners up, and takes no corner after', () => {
    const { content, outline } = begin([A, B])
    outline.finish()
    expect(content.value.closed).toBe(false)
    outline.add(C)
    outline.finish()
    expect(content.value.closed).toBe(true)
    outline.add(D)
    expect(content.value.points).toEqual([A, B, C])
    outline.undo()
    expect(content.value.closed).toBe(false)
  })

  it('drops a last corner on the first', () => {
    const { content, outline } = begin([A, B, C, D])
    outline.add(A)
    outline.finish()
    expect(content.value.points).toEqual([A, B, C, D])
  })

  it('names the two edges that cross', () => {
    const { outline } = begin([A, C, B, D])
    expect(outline.geometry.value).toBeNull()
    expect(outline.findings.value[0]?.code).toBe('geometry.self_intersection')
    expect(crossingEdges(outline.findings.value)).toEqual([0, 2])
  })
})

describe('the draft of a block', () => {
  it('is a closed ring with 7 decimals', () => {
    expect(outlineOf([[1.123456789, 2], [3, 4], [5, 7]])).toEqual({
      type: 'Polygon', coordinates: [[[1.1234568, 2], [3, 4], [5, 7], [1.1234568, 2]]],
    })
    expect(outlineOf([A, B])).toBeNull()
  })
  it('is begun by a corner or a word', () => {
    expect(isBlockDraftBegun(emptyBlockDraft('draw'))).toBe(false)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('draw'), points: [A] })).toBe(true)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('points'), typed: ' ' })).toBe(false)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('points'), name: 'West' })).toBe(true)
  })
})
