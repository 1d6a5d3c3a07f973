import { ExactDecimal } from './exactDecimal.ts'

export type QuantityProblem = {
  id: 'number.required' | 'number.ambiguous' | 'number.format' | 'number.precision' | 'number.range'
  params: Record<string, string | number>
}
export type ParsedQuantity = { ok: true; value: string } | { ok: false; problem: QuantityProblem }

const WHOLE_DIGITS = 7
const DECIMAL_DIGITS = 4
const FRACTION_SIGNS: Readonly<Record<string, readonly [number, number]>> = {
  '½': [1, 2], '¼': [1, 4], '¾': [3, 4], '⅓': [1, 3], '⅔': [2, 3],
  '⅕': [1, 5], '⅖': [2, 5], '⅗': [3, 5], '⅘': [4, 5], '⅙': [1, 6], '⅚': [5, 6],
  '⅛': [1, 8], '⅜': [3, 8], '⅝': [5, 8], '⅞': [7, 8],
}
const DECIMAL = /^(\d*)(?:[.,](\d+))?$/
const GROUPED = /^\d{1,3}(?:[ \u00A0\u202F]\d{3})+(?:[.,]\d+)?$/
const GROUPED_BY_COMMA = /^[1-9]\d{0,2},\d{3}$/
const SIGN_FRACTION = /^(\d*) ?([½¼¾⅓⅔⅕⅖⅗⅘⅙⅚⅛⅜⅝⅞])$/
const TYPED_FRACTION = /^(?:(\d+) )?(\d{1,4}) ?[/\u2044] ?(\d{1,4})$/

/**
 * A number as a person types it, as the plain decimal text that is stored: `1.5`, `1,5`, `½`, `1½`, `1 1/2`, `1 200`.
 * Comma and point both stand for the decimal mark, so one text has one reading in every language; trailing zeros are kept. Only a comma before
 * three last digits (`1,234`) is asked about: in English it is a thousand, and nobody should get a thousandth of a dose or a thousandfold.
 * At most 7 digits before the mark and 4 after; a fraction that needs more (⅓) is refused, not rounded.
 * @param signed true where the number may be below zero (temperatures).
 */
export function parseQuantityText(text: string, { signed = false }: { signed?: boolean } = {}): ParsedQuantity {
  const params = { text: text.slice(0, 80) }
  const typed = text.slice(0, 200).replace(/^[\s\u00A0\u202F]+|[\s\u00A0\u202F]+$/g, '')
  if (typed === '') return { ok: false, problem: { id: 'number.required', params: {} } }
  const isNegative = signed && /^[-\u2212]/.test(typed)
  if (GROUPED_BY_COMMA.test(typed)) return { ok: false, problem: { id: 'number.ambiguous', params: { ...params, whole: typed.replace(',', ''), decimal: typed.replace(',', '.') } } }
  const digits = readUnsigned(isNegative ? typed.slice(1) : typed)
  if (digits === null) return { ok: false, problem: { id: 'number.format', params } }
  const [whole = '', decimals = ''] = digits.split('.')
  if (whole.length > WHOLE_DIGITS) {
    return { ok: false, problem: { id: 'number.range', params: { ...params, digits: WHOLE_DIGITS } } }
  }
  if (decimals.length > DECIMAL_DIGITS) {
    return { ok: false, problem: { id: 'number.precision', params: { ...params, digits: DECIMAL_DIGITS } } }
  }
  return { ok: true, value: isNegative && /[1-9]/.test(digits) ? `-${digits}` : digits }
}

function readUnsigned(typed: string): string | null {
  const decimal = DECIMAL.exec(GROUPED.test(typed) ? typed.replace(/[ \u00A0\u202F]/g, '') : typed)
  if (decimal) return joinDigits(decimal[1] ?? '', decimal[2])
  const sign = SIGN_FRACTION.exec(typed)
  if (sign) {
    const [numerator, denominator] = FRACTION_SIGNS[sign[2] ?? ''] ?? [0, 0]
    return addFraction(sign[1] ?? '', numerator, denominator)
  }
  const fraction = TYPED_FRACTION.exec(typed)
  return fraction ? addFraction(fraction[1] ?? '', Number(fraction[2]), Number(fraction[3])) : null
}

function joinDigits(whole: string, decimals: string | undefined): string | null {
  if (whole === '' && decimals === undefined) return null
  const plain = whole.replace(/^0+(?=\d)/, '') || '0'
  return decimals === undefined ? plain : `${plain}.${decimals}`
}

function addFraction(whole: string, numerator: number, denominator: number): string | null {
  if (denominator === 0) return null
  return new ExactDecimal(numerator).div(denominator).plus(whole || '0').toFixed()
}
