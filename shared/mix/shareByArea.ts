import { ExactDecimal } from '../units/exactDecimal.ts'

/**
 * A total shared out by area. Every share has as many decimals as 15 significant digits of the total have; the last one takes
 * the remainder, so that the shares add up to the total exactly.
 * @param totalL litres, at most 15 significant digits. @param areasM2 at least one, each above 0.
 */
export function shareByArea(totalL: ExactDecimal, areasM2: readonly ExactDecimal[]): ExactDecimal[] {
  const allM2 = areasM2.reduce((sum, area) => sum.plus(area))
  const decimals = Math.max(0, 14 - totalL.e)
  const shares = areasM2.slice(0, -1).map((area) => totalL.times(area).div(allM2).toDecimalPlaces(decimals, ExactDecimal.ROUND_DOWN))
  return [...shares, shares.reduce((rest, share) => rest.minus(share), totalL)]
}
