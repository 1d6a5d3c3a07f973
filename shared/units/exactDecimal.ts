import { Decimal } from 'decimal.js'

/** Decimals of 40 significant digits, rounded half up, never written with an exponent. */
export const ExactDecimal = Decimal.clone({ precision: 40, rounding: Decimal.ROUND_HALF_UP, toExpNeg: -9e15, toExpPos: 9e15 })
export type ExactDecimal = Decimal

const PLAIN = /^-?\d{1,400}(\.\d{1,400})?$/

/**
 * Reads plain decimal text: digits, one point, a leading minus; nothing else.
 * @throws {RangeError} for anything else, naming it.
 */
export function readDecimal(text: string): ExactDecimal {
  if (!PLAIN.test(text)) throw new RangeError(`not a plain decimal: ${text.slice(0, 80)}`)
  return new ExactDecimal(text)
}

/** Plain decimal text of at most 15 significant digits, without exponent and without trailing zeros. */
export function writeDecimal(value: ExactDecimal): string {
  return value.toSignificantDigits(15).toFixed()
}
