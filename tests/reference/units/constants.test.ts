import { describe, expect, it } from 'vitest'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { EXACT_CONSTANTS } from './constantCases.ts'

describe('constants exact by definition', () => {
  it.each(EXACT_CONSTANTS)('1 $from = $text $to ($source)', ({ from, to, text }) => {
    expect(convertQuantity({ value: '1', unit: from }, to)).toBe(text)
    expect(convertQuantity({ value: text, unit: to }, from)).toBe('1')
    expect(convertQuantity({ value: '1.0000001', unit: from }, to)).not.toBe(text)
  })

  it.each([
    { value: '32', from: 'degF', to: 'degC', text: '0' },
    { value: '212', from: 'degF', to: 'degC', text: '100' },
    { value: '-40', from: 'degC', to: 'degF', text: '-40' },
    { value: '37', from: 'degC', to: 'degF', text: '98.6' },
    { value: '5', from: 'diffC', to: 'diffF', text: '9' },
    { value: '0', from: 'diffC', to: 'diffF', text: '0' },
  ] as const)('$value $from = $text $to (definition of the Fahrenheit scale)', ({ value, from, to, text }) => {
    expect(convertQuantity({ value, unit: from }, to)).toBe(text)
  })
})
