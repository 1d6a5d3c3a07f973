import type { Check } from '../contract/record.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { airOf } from '../weather/airOf.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { RecordFacts } from './recordFacts.ts'

/** The house rule until a farm sets its own, °C. */
const LOW_C = '2'
const HIGH_C = '8'

/**
 * Delta T while spraying leaves against the house rule: 2 to 8 °C. Under it drops hang in damp air, over it they dry before they wet
 * a leaf. A drench has none.
 * @source advised band 2 to 8 °C, not above 10: T. Wolf, "What is Delta T"; GRDC, Spray application manual, module 10.3. A label wins over it.
 */
export function judgeDeltaT({ method, weather }: RecordFacts['content']): Check | null {
  if (method !== 'foliar') return null
  const base = { code: 'house.deltaT', rests: 'house', title: words('checks.deltaT.title'), source: words('checks.deltaT.source'), about: 'air' } as const
  const limits = { low: Number(LOW_C), high: Number(HIGH_C), unit: 'degC' }
  const air = airOf(weather)
  if (air === null) return buildCheck({ ...base, verdict: 'unknown', text: words('checks.deltaT.notKnown', limits) })
  // Judged as it is printed, to a tenth: the two ways to find a wet bulb differ by more.
  const deltaT = new ExactDecimal(air.deltaTC).toDecimalPlaces(1)
  const value = deltaT.toNumber()
  const isUnder = deltaT.lt(LOW_C)
  const isOver = deltaT.gt(HIGH_C)
  const outside = isUnder ? 'checks.deltaT.under' : 'checks.deltaT.over'
  return buildCheck({
    ...base,
    verdict: isUnder || isOver ? 'caution' : 'pass',
    text: words(isUnder || isOver ? outside : 'checks.deltaT.within', { ...limits, value }),
    figure: words('checks.figure.amount', { value, unit: 'degC' }),
    band: { low: limits.low, high: limits.high, value, unit: 'degC' },
  })
}
