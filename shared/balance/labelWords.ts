import { words } from '../checks/buildCheck.ts'
import type { Message } from '../contract/common.ts'
import type { LabelLimits } from '../contract/input.ts'

/**
 * The limits a label sets, one message each, in the order a sprayer needs them; empty where it sets none.
 * @param label as written down, decimals as text.
 */
export function labelWords(label: LabelLimits): Message[] {
  const found: Message[] = []
  if (label.maxRate !== null) {
    found.push(words('inputs.label.maxRate', { value: Number(label.maxRate.value), unit: label.maxRate.unit }))
  }
  const strength = strengthWords(label)
  if (strength !== null) found.push(strength)
  if (label.reEntryHours !== null) found.push(words('inputs.label.reEntry', { hours: Number(label.reEntryHours) }))
  if (label.preHarvestDays !== null) {
    found.push(label.preHarvestDays === 0 ? words('inputs.label.preHarvestNone') : words('inputs.label.preHarvest', { days: label.preHarvestDays }))
  }
  return found
}

function strengthWords({ minStrengthPct, maxStrengthPct }: LabelLimits): Message | null {
  if (minStrengthPct !== null && maxStrengthPct !== null) {
    return words('inputs.label.strengthBetween', { min: Number(minStrengthPct), max: Number(maxStrengthPct) })
  }
  if (maxStrengthPct !== null) return words('inputs.label.strengthMost', { max: Number(maxStrengthPct) })
  return minStrengthPct === null ? null : words('inputs.label.strengthLeast', { min: Number(minStrengthPct) })
}
