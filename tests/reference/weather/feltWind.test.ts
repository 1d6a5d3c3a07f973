import { describe, expect, it } from 'vitest'
import { FELT_RANGES, FELT_WINDS } from '../../../shared/weather/feltWind.ts'

// Beaufort scale, equivalent speeds at 10 m over open flat ground, m/s: WMO-No. 306, Manual on Codes, Vol. I.1, code table 1100.
const BEAUFORT = [[0, 0.2], [0.3, 1.5], [1.6, 3.3], [3.4, 5.4], [5.5, 7.9]] as const

describe('wind that is felt', () => {
  it.each(FELT_WINDS)('%s spans its Beaufort numbers, and the record holds its middle', (felt) => {
    const { beaufort: [from, to], ms, middleMs } = FELT_RANGES[felt]
    const [low, high] = [BEAUFORT[from]?.[0] ?? Number.NaN, BEAUFORT[to]?.[1] ?? Number.NaN]
    expect(ms.map(Number)).toEqual([low, high])
    expect(Math.abs(Number(middleMs) - (low + high) / 2)).toBeLessThan(0.051)
  })

  it('leaves no gap and no number out', () => {
    expect(FELT_WINDS.flatMap((felt) => FELT_RANGES[felt].beaufort)).toEqual([0, 1, 2, 2, 3, 3, 4, 4])
  })
})
