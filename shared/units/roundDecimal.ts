import Decimal from 'decimal.js'

/** Decimal text rounded half up to at most so many decimals, in plain notation without padding. */
export function roundDecimal(value: string, decimals: number): string {
  return new Decimal(value).toDecimalPlaces(decimals, Decimal.ROUND_HALF_UP).toFixed()
}
