import { describe, expect, it } from 'vitest'
import { freeSpot, type LabelBox } from '../../../../src/components/map/freeSpot.ts'

describe('freeSpot', () => {
  it('keeps the middle where nothing stands', () => {
    expect(freeSpot([], [50, 50], [20, 12], false)).toEqual([50, 50])
  })

  it('steps aside for a label that stands there', () => {
    const taken: LabelBox[] = []
    freeSpot(taken, [50, 50], [18, 12], true)
    const second = freeSpot(taken, [62, 50], [18, 12], true)
    expect(second).not.toBeNull()
    expect(second).not.toEqual([62, 50])
    expect(taken).toHaveLength(2)
  })

  it('gives up where it may not step', () => {
    const taken: LabelBox[] = []
    freeSpot(taken, [50, 50], [20, 12], false)
    expect(freeSpot(taken, [52, 50], [20, 12], false)).toBeNull()
  })
})
