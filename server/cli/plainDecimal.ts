import { Decimal } from 'decimal.js'

/** A number of JSON as plain decimal text, without exponent, as `shared` takes it. */
export function plainDecimal(value: number): string {
  return new Decimal(value).toFixed()
}
