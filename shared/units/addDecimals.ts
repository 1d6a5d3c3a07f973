import Decimal from 'decimal.js'

/** `a + b` for two decimal texts of one unit, exact, as plain decimal text. */
export function addDecimals(a: string, b: string): string {
  return new Decimal(a).plus(b).toFixed()
}
