import { describe, expect, it } from 'vitest'
import type { Position } from '../../../../shared/geo/geometryTypes.ts'
import { begunShape, emptyBlockDraft, isBlockDraftBegun, readBlockDraft } from '../../../../src/composables/block/blockDraftContent.ts'

const A: Position = [-123.312, 44.606]
const B: Position = [-123.31, 44.606]
const C: Position = [-123.31, 44.605]

describe('the draft of a block', () => {
  it('is begun by a corner or a word', () => {
    expect(isBlockDraftBegun(emptyBlockDraft('draw'))).toBe(false)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('draw'), shape: begunShape([A]) })).toBe(true)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('points'), typed: ' ' })).toBe(false)
    expect(isBlockDraftBegun({ ...emptyBlockDraft('points'), name: 'West' })).toBe(true)
  })

  it('is read as an older build kept it: corners in a row, finished or not', () => {
    const words = { by: 'draw' as const, typed: '', code: 'W', name: 'West', crop: '' }
    expect(readBlockDraft({ ...words, points: [A, B, C], closed: true }, 'points')).toEqual({ ...words, shape: { parts: [[[A, B, C]]], open: null } })
    expect(readBlockDraft({ ...words, points: [A], closed: false }, 'points')).toEqual({ ...words, shape: begunShape([A]) })
    expect(readBlockDraft(emptyBlockDraft('points'), 'draw')).toEqual(emptyBlockDraft('points'))
  })
})
