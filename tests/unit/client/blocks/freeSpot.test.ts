import { describe, expect, it } from 'vitest'
import { freeSpot, type TakenGround } from '../../../../src/components/map/freeSpot.ts'
import { labelSpot } from '../../../../src/components/map/labelSpot.ts'
import type { Pixel } from '../../../../src/composables/map/mapTypes.ts'

const box = (x: number, y: number, width: number, height: number): Pixel[] => [
  [x, y], [x + width, y], [x + width, y + height], [x, y + height],
]
const bare = (): TakenGround => ({ labels: [], blocks: [] })

describe('freeSpot', () => {
  it('keeps the middle where nothing stands', () => {
    expect(freeSpot(bare(), [50, 50], [20, 12], false)).toEqual([50, 50])
  })

  it('steps aside for a label that stands there', () => {
    const taken = bare()
    freeSpot(taken, [50, 50], [18, 12], true)
    const second = freeSpot(taken, [62, 50], [18, 12], true)
    expect(second).not.toBeNull()
    expect(second).not.toEqual([62, 50])
    expect(taken.labels).toHaveLength(2)
  })

  it('gives up where it may not step', () => {
    const taken = bare()
    freeSpot(taken, [50, 50], [20, 12], false)
    expect(freeSpot(taken, [52, 50], [20, 12], false)).toBeNull()
  })

  it('steps out of a block beside it', () => {
    // The neighbour reaches one pixel into the label, from the left.
    const blocks = [[box(0, 0, 42, 100)]]
    expect(freeSpot({ labels: [], blocks }, [50, 50], [18, 12], true)).toEqual([57, 50])
  })

  it('drops the label of a strip whose top leans on a larger block', () => {
    const [large, strip] = [box(0, 0, 200, 100), box(90, 100, 8, 60)]
    const { form, at } = labelSpot([strip], [large])
    expect(form).toBe('outside')
    expect(freeSpot({ labels: [], blocks: [[large]] }, at, [18, 12], true)).toBeNull()
  })

  it('stands in a hole of another block, for that is not its ground', () => {
    const blocks = [[box(0, 0, 200, 200), box(50, 50, 100, 100)]]
    expect(freeSpot({ labels: [], blocks }, [100, 100], [18, 12], true)).toEqual([100, 100])
    expect(freeSpot({ labels: [], blocks }, [25, 25], [18, 12], false)).toBeNull()
  })
})
