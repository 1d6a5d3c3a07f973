import { describe, expect, it } from 'vitest'
import { areaFor, figureFor, quantityFor, storedFor, type Reader } from '../../../shared/messages/readFigure.ts'

const US: Reader = { language: 'en', units: 'us' }
const METRIC: Reader = { language: 'es', units: 'metric' }

describe('figures as a person reads them', () => {
  it('are converted by the exact constants and rounded once', () => {
    // 1 ha is 2.471 053 8 acres (NIST SP 811 B.8, acre 4046.8564224 m²); 1 US gal/acre is 9.353 956 L/ha.
    expect(areaFor(US, 10_000, 7)).toBe('2.4710538')
    expect(figureFor(US, '9.353956229', 'L/ha', { digits: 6 })).toBe('1.000000')
    expect(figureFor(US, '1609.344', 'm', { digits: 2 })).toBe('5\u00a0280.00')
    expect(quantityFor(US, 20, 'degC', { digits: 0 })).toBe('68\u00a0°F')
    // Rounded in between to 0.81 ha it would be 2.00 acres.
    expect(areaFor(US, 8_149)).toBe('2.01')
  })

  it('stay as they are where the reader reads their unit', () => {
    expect(areaFor(METRIC, '9312.5')).toBe('0,93')
    expect(storedFor(METRIC, '12.3456', 'm')).toBe('12,3456')
    expect(storedFor(US, '12.3456', 'm')).toBe('40.5')
    expect(storedFor(US, '400', 'L')).toBe('105.7')
  })

  it('refuse what is no number', () => {
    expect(() => figureFor(US, 'much', 'L', {})).toThrow(RangeError)
    expect(() => areaFor(US, Number.NaN)).toThrow(RangeError)
  })
})
