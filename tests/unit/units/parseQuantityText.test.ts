import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { decimalText, signedDecimal } from '../../../shared/contract/quantity.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'

const RUNS = { seed: 20_260_616, numRuns: 1_000 }

describe('parseQuantityText', () => {
  it.each([
    ['1,5', '1.5'], ['1.5', '1.5'], ['½', '0.5'], ['1½', '1.5'], ['1 ½', '1.5'], ['1 1/2', '1.5'], ['1/2', '0.5'], ['3 / 4', '0.75'], ['1 1\u20442', '1.5'],
    ['  12  ', '12'], ['\u00A012\u00A0', '12'], ['007', '7'], ['0', '0'], ['.5', '0.5'], [',25', '0.25'], ['1.50', '1.50'], ['⅛', '0.125'], ['⅜', '0.375'],
    ['1 234', '1234'], ['1\u00A0234,5', '1234.5'], ['1\u202F234.5', '1234.5'], ['1 234 567', '1234567'], ['10/4', '2.5'],
  ])('reads %o as %o', (text, value) => {
    expect(parseQuantityText(text)).toEqual({ ok: true, value })
  })

  it.each([
    '12abc', '0x10', '1e3', '٣', '+5', '-5', '1,234.5', '1.234,5', '5.', ',', '.', '1 23', '12 34', '1 2 3', 'NaN', 'Infinity', '1/0', '1//2', '½½', '1.5½', '½ 1', '5 L', '−5', '１',
  ])('refuses %o', (text) => {
    expect(parseQuantityText(text)).toEqual({ ok: false, problem: { id: 'number.format', params: { text } } })
  })

  it('asks about a comma before three last digits, and about no other', () => {
    expect(parseQuantityText('1,234')).toEqual({ ok: false, problem: { id: 'number.ambiguous', params: { text: '1,234', whole: '1234', decimal: '1.234' } } })
    expect(parseQuantityText('12,500')).toMatchObject({ ok: false, problem: { id: 'number.ambiguous' } })
    for (const text of ['0,125', '1,23', '1,2345', '1.234', '1234,567']) expect(parseQuantityText(text).ok, text).toBe(true)
  })

  it.each(['', ' ', '\u00A0'])('asks for a number where %o is typed', (text) => {
    expect(parseQuantityText(text)).toEqual({ ok: false, problem: { id: 'number.required', params: {} } })
  })

  it.each(['1.00005', '⅓', '2/3', '1 1/7'])('refuses %o rather than round it', (text) => {
    expect(parseQuantityText(text)).toEqual({ ok: false, problem: { id: 'number.precision', params: { text, digits: 4 } } })
  })

  it('refuses more than seven digits before the mark', () => {
    expect(parseQuantityText('12345678')).toMatchObject({ ok: false, problem: { id: 'number.range' } })
  })

  it('takes a minus only where it is asked for, and no minus nothing', () => {
    expect(parseQuantityText('-2,5', { signed: true })).toEqual({ ok: true, value: '-2.5' })
    expect(parseQuantityText('\u22122', { signed: true })).toEqual({ ok: true, value: '-2' })
    expect(parseQuantityText('-0', { signed: true })).toEqual({ ok: true, value: '0' })
    expect(signedDecimal.safeParse('-2.5').success).toBe(true)
  })

  it('never throws, and what it accepts the contract accepts', () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.string({ unit: fc.constantFrom(...'0123456789.,/ ½⅓-+ e\u00A0') })), (text) => {
      const parsed = parseQuantityText(text)
      if (parsed.ok) expect(decimalText.safeParse(parsed.value).success).toBe(true)
      else expect(String(parsed.problem.params['text'] ?? '').length).toBeLessThanOrEqual(80)
    }), RUNS)
  })

  it.each(['en', 'es'] as const)('reads back what is shown in %s', (locale) => {
    fc.assert(fc.property(fc.nat(9_999_999), fc.nat(9_999), (whole, part) => {
      const value = `${whole}.${String(part).padStart(4, '0')}`
      expect(parseQuantityText(formatNumber(value, { digits: 4 }, locale))).toEqual({ ok: true, value })
    }), RUNS)
  })
})
