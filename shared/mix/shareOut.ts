import { ExactDecimal } from '../units/exactDecimal.ts'

/**
 * A total shared out by weights: areas, or counts. Every share has as many decimals as 15 significant digits of the total have; the
 * last one takes the remainder, so that the shares add up to the total exactly.
 * @param total at most 15 significant digits. @param weights at least one, each above 0.
 */
export function shareOut(total: ExactDecimal, weights: readonly ExactDecimal[]): ExactDecimal[] {
  const all = weights.reduce((sum, weight) => sum.plus(weight))
  const decimals = Math.max(0, 14 - total.e)
  const shares = weights.slice(0, -1).map((weight) => total.times(weight).div(all).toDecimalPlaces(decimals, ExactDecimal.ROUND_DOWN))
  return [...shares, shares.reduce((rest, share) => rest.minus(share), total)]
}
