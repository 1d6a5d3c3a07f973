import { RESTS, type Check } from '../contract/record.ts'
import { byVerdict } from './worstFirst.ts'

/** Checks in reading order: by what they rest on (law first), worst first inside it, else as they came. */
export function sortChecks(checks: readonly Check[]): Check[] {
  return checks.toSorted((one, other) => RESTS.indexOf(one.rests) - RESTS.indexOf(other.rests) || byVerdict(one, other))
}
