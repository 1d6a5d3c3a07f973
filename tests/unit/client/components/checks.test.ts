import { describe, expect, it } from 'vitest'
import { chooseTies, type Tie } from '../../../../src/components/checks/chooseTies.ts'

const tie = (about: string, verdict: Tie['verdict'], fromY: number, toY: number): Tie => ({ about, verdict, fromX: 0, fromY, toY })

describe('chooseTies', () => {
  it('drops the lesser of two that cross', () => {
    expect(chooseTies([tie('wind', 'caution', 10, 90), tie('line:0', 'stop', 50, 20)]).map((each) => each.about)).toEqual(['line:0'])
  })

  it('keeps those that run side by side', () => {
    expect(chooseTies([tie('a', 'pass', 10, 20), tie('b', 'pass', 50, 60)])).toHaveLength(2)
  })

  it('draws one a thing, its worst', () => {
    expect(chooseTies([tie('a', 'pass', 10, 20), tie('a', 'stop', 10, 40)])).toEqual([tie('a', 'stop', 10, 40)])
  })

  it('draws six at most', () => {
    expect(chooseTies(Array.from({ length: 9 }, (_, index) => tie(`${index}`, 'unknown', index * 10, index * 10)))).toHaveLength(6)
  })
})
