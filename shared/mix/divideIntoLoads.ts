import { ExactDecimal } from '../units/exactDecimal.ts'

/** What is left over below this is arithmetic, not liquid. */
const HAIR_L = '1e-9'

/**
 * Full tanks in a total and what remains for the last part load.
 * @param totalL litres, 0 or more. @param tankL usable litres of the tank, above 0.
 * @returns `full` loads and `lastL` litres, so that full × tankL + lastL = totalL; a remainder within 1e-9 L of nothing or of a
 * full tank counts as dividing.
 */
export function divideIntoLoads(totalL: ExactDecimal, tankL: ExactDecimal): { full: number; lastL: ExactDecimal } {
  const full = totalL.div(tankL).floor()
  const rest = totalL.minus(full.times(tankL))
  if (rest.lt(HAIR_L)) return { full: full.toNumber(), lastL: new ExactDecimal(0) }
  if (tankL.minus(rest).lt(HAIR_L)) return { full: full.toNumber() + 1, lastL: new ExactDecimal(0) }
  return { full: full.toNumber(), lastL: rest }
}
