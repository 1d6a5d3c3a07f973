import { describe, expect, it } from 'vitest'
import { usedAgainstPlanned } from '../../../shared/mix/usedAgainstPlanned.ts'

describe('usedAgainstPlanned', () => {
  it.each([
    [{ value: '40', unit: 'L' }, { value: '37.5', unit: 'L' }, { direction: 'more', difference: '2.5', unit: 'L', percent: '6.66666666666667' }],
    [{ value: '2', unit: 'L' }, { value: '2000', unit: 'mL' }, { direction: 'same', difference: '0', unit: 'L', percent: '0' }],
    [{ value: '900', unit: 'g' }, { value: '1', unit: 'kg' }, { direction: 'less', difference: '100', unit: 'g', percent: '10' }],
    // 1 US gallon is 3.785411784 L (NIST Handbook 44, appendix C).
    [{ value: '1', unit: 'galUS' }, { value: '3.785411784', unit: 'L' }, { direction: 'same', difference: '0', unit: 'galUS', percent: '0' }],
  ] as const)('%j against %j', (used, planned, expected) => {
    expect(usedAgainstPlanned(used, planned)).toEqual(expected)
  })

  it('does not set a volume against a mass, or anything against nothing', () => {
    expect(usedAgainstPlanned({ value: '1', unit: 'L' }, { value: '1', unit: 'kg' })).toBeNull()
    expect(usedAgainstPlanned({ value: '1', unit: 'L' }, { value: '0', unit: 'L' })).toBeNull()
  })
})
