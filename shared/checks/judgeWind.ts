import type { Check } from '../contract/record.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { RecordFacts } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'
import { settle } from './settle.ts'

/** The house rule until a farm sets its own, metres a second. */
const LOW_MS = '1.3'
const HIGH_MS = '3.6'

/**
 * Wind while spraying leaves against the house rule: at least 1.3 and at most 3.6 m/s. A drench has none.
 * @source common practice, 3 to 8 mph (1.34 to 3.58 m/s): pesticidestewardship.org, "Evaluate the weather". A label wins over it.
 */
export function judgeWind({ method, weather }: RecordFacts['content']): Check | null {
  if (method !== 'foliar') return null
  const base = { code: 'house.wind', rests: 'house', title: words('checks.wind.title'), source: words('checks.wind.source'), about: 'wind' } as const
  const limits = { low: Number(LOW_MS), high: Number(HIGH_MS), unit: 'ms' }
  const wind = weather?.wind
  if (!wind) return buildCheck({ ...base, verdict: 'unknown', text: words('checks.wind.notRead', limits) })
  const speed = settle(convertQuantity({ value: wind.value, unit: wind.unit }, 'ms'))
  const value = roundForReader(speed.toFixed(), [LOW_MS, HIGH_MS])
  const isUnder = speed.lt(LOW_MS)
  const isOver = speed.gt(HIGH_MS)
  const outside = isUnder ? 'checks.wind.under' : 'checks.wind.over'
  return buildCheck({
    ...base,
    verdict: isUnder || isOver ? 'caution' : 'pass',
    text: words(isUnder || isOver ? outside : 'checks.wind.within', { ...limits, value }),
    figure: words('checks.figure.amount', { value, unit: 'ms' }),
    band: { low: limits.low, high: limits.high, value, unit: 'ms' },
  })
}
