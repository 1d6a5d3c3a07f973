import Decimal from 'decimal.js'

/** A finite number as plain decimal text, never with an exponent. @throws {RangeError} if it is not finite. */
export function decimalTextOf(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`Not a finite number: ${value}`)
  return new Decimal(value).toFixed()
}
