import { RESTS, type Check, type Rests } from '../contract/record.ts'
import { sortChecks } from './sortChecks.ts'

/** Checks that rest on the same. */
export interface CheckGroup { rests: Rests; checks: Check[] }

/** Checks in their groups, in the order of what they rest on, worst first inside each; empty groups are left out. */
export function groupChecks(checks: readonly Check[]): CheckGroup[] {
  const sorted = sortChecks(checks)
  return RESTS.map((rests) => ({ rests, checks: sorted.filter((check) => check.rests === rests) })).filter((group) => group.checks.length > 0)
}
