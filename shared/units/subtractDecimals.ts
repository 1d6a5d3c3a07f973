import Decimal from 'decimal.js'

/** `a − b` for two decimal texts of one unit, exact, as plain decimal text. */
export function subtractDecimals(a: string, b: string): string {
  return new Decimal(a).minus(b).toFixed()
}
