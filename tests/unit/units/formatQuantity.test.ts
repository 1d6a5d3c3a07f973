import { describe, expect, it } from 'vitest'
import { formatHectares, formatNumber, formatRate, formatVolumeL } from '../../../shared/units/formatQuantity.ts'

describe('formatNumber', () => {
  it.each([
    { value: '1234567.891', rounding: { digits: 2 }, en: '1\u00A0234\u00A0567.89', es: '1\u00A0234\u00A0567,89' },
    { value: 0.5, rounding: { digits: 0 }, en: '1', es: '1' },
    { value: '-0.04', rounding: { digits: 1 }, en: '0.0', es: '0,0' },
    { value: -12.5, rounding: { digits: 1 }, en: '\u221212.5', es: '\u221212,5' },
    { value: '2', rounding: { digits: 2 }, en: '2.00', es: '2,00' },
    { value: '337.034920793144', rounding: { significant: 4 }, en: '337', es: '337' },
    { value: '0.012345', rounding: { significant: 3 }, en: '0.0123', es: '0,0123' },
    { value: '123456', rounding: { significant: 3 }, en: '123\u00A0000', es: '123\u00A0000' },
    { value: 1e21, rounding: { digits: 0 }, en: '1\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000', es: '1\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000\u00A0000' },
    { value: 0.1 + 0.2, rounding: {}, en: '0.3', es: '0,3' },
    { value: '12.5', rounding: {}, en: '12.5', es: '12,5' },
    { value: 999, rounding: {}, en: '999', es: '999' },
    { value: 1000, rounding: {}, en: '1\u00A0000', es: '1\u00A0000' },
  ])('$value with $rounding', ({ value, rounding, en, es }) => {
    expect(formatNumber(value, rounding, 'en')).toBe(en)
    expect(formatNumber(value, rounding, 'es')).toBe(es)
  })

  it.each([Number.NaN, Number.POSITIVE_INFINITY, '', 'abc', '1e3'])('refuses %o', (value) => {
    expect(() => formatNumber(value, {}, 'en')).toThrow(RangeError)
  })
})

describe('figures of one kind', () => {
  it('rounds half up from the exact decimal: 1.005 ha is 1.01, where a double would give 1.00', () => {
    expect(formatHectares(10050, 'en')).toBe('1.01')
  })

  it('shows hectares with two decimals, four at most', () => {
    expect(formatHectares('500.0125', 'es')).toBe('0,05')
    expect(formatHectares('500.0125', 'en', 4)).toBe('0.0500')
    expect(formatHectares('500.0125', 'en', 9)).toBe('0.0500')
  })

  it('shows litres with one decimal and rates with four digits', () => {
    expect(formatVolumeL('1011.10476237943', 'en')).toBe('1\u00A0011.1')
    expect(formatRate('2.19233349116162', 'es')).toBe('2,192')
  })
})
