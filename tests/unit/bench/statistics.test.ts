import { describe, expect, it } from 'vitest'
import { quantile, summarise, type Round } from '../../bench/statistics.ts'

const round = (ours: number, baseline: number, again = baseline): Round => ({ ours, baseline, again })

describe('quantile', () => {
  // Type 7 of Hyndman and Fan (The American Statistician 50, 1996), as R's quantile() gives it by default.
  it.each([
    { values: [1, 2, 3, 4], share: 0.25, expected: 1.75 },
    { values: [4, 3, 2, 1], share: 0.5, expected: 2.5 },
    { values: [1, 2, 3, 4], share: 0.75, expected: 3.25 },
    { values: [7], share: 0.25, expected: 7 },
    { values: [10, 20, 30], share: 0.5, expected: 20 },
  ])('$share of $values is $expected', ({ values, share, expected }) => {
    expect(quantile(values, share)).toBeCloseTo(expected, 12)
  })

  it('refuses no values', () => {
    expect(() => quantile([], 0.5)).toThrow(RangeError)
  })
})

describe('summarise', () => {
  it('takes the median of the ratios, not the ratio of the medians', () => {
    // Medians are 30 and 20; a slow spell lifted both sides of the last round.
    const { ratio, ours, baseline } = summarise([round(12, 10), round(30, 20), round(330, 300)])
    expect(ratio).toBeCloseTo(1.2, 12)
    expect([ours, baseline]).toEqual([30, 20])
  })

  it('gives the quartiles and the number of rounds', () => {
    expect(summarise([round(1, 1), round(2, 1), round(3, 1), round(4, 1)])).toMatchObject({ q1: 1.75, ratio: 2.5, q3: 3.25, n: 4 })
  })

  it.each([
    { again: 9.4, noisy: true },
    { again: 9.5, noisy: false },
    { again: 10.5, noisy: false },
    { again: 10.6, noisy: true },
  ])('calls it noisy ($noisy) where the baseline took 10 and then $again', ({ again, noisy }) => {
    expect(summarise([round(15, 10, again)])).toMatchObject({ control: again / 10, noisy, ratio: 1.5 })
  })
})
