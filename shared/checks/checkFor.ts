import type { Message } from '../contract/common.ts'
import type { Check } from '../contract/record.ts'
import { messageFor } from '../messages/messageFor.ts'
import type { UnitSystem } from '../units/readingUnit.ts'

/** House rules whose figure and band stand in the unit of their sentence. */
const BANDED = ['house.wind', 'house.deltaT']

/**
 * A check as a reader of a system of measures reads it. What was judged and signed is not touched: this is for the screen. A label's limit
 * stays in the label's own unit.
 */
export function checkFor(check: Check, system: UnitSystem): Check {
  const text = messageFor(check.text, system)
  if (text === check.text || !BANDED.includes(check.code)) return { ...check, text }
  const { value, low, high, unit } = text.params
  const figure: Message | null = check.figure && { ...check.figure, params: { ...check.figure.params, ...(value !== undefined && { value }), ...(unit !== undefined && { unit }) } }
  const band = check.band && typeof value === 'number' && typeof low === 'number' && typeof high === 'number' ? { value, low, high, unit: String(unit) } : check.band
  return { ...check, text, figure, band }
}
