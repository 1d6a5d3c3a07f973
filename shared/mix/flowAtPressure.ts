import { ExactDecimal } from '../units/exactDecimal.ts'

/**
 * Flow of one nozzle at another pressure, in the unit it was given in: it goes with the square root of the pressure.
 * @param from flow, and the pressure at which it was measured, bar; both above 0. @param toBar above 0.
 * @throws {RangeError} if a value is not above 0.
 * @source F1.8, q1/q2 = sqrt(p1/p2) (tests/reference/mix names the publication). A model: a worn tip or another liquid is off it.
 * @example flowAtPressure({ flow: '0.8', bar: '3' }, '2').toFixed(2) // "0.65"
 */
export function flowAtPressure(from: { flow: string; bar: string }, toBar: string): ExactDecimal {
  const [flow, bar, to] = [from.flow, from.bar, toBar].map((text) => {
    const value = new ExactDecimal(text)
    if (value.lte(0) || !value.isFinite()) throw new RangeError(`flow and pressure must be above 0, got ${text}`)
    return value
  }) as [ExactDecimal, ExactDecimal, ExactDecimal]
  return flow.times(to.div(bar).sqrt())
}
