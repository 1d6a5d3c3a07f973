import type { Check, Rests, Verdict } from '../../../shared/contract/record.ts'

/** Worst first. */
const ORDER: readonly Verdict[] = ['stop', 'caution', 'unknown', 'pass']
const GROUPS: readonly Rests[] = ['law', 'label', 'certifier', 'house', 'recipe']

/** Checks of one group. */
export interface CheckGroup { rests: Rests; checks: Check[] }

/** Checks in their groups, in the order of what they rest on, worst first inside each; empty groups are left out. */
export function groupChecks(checks: readonly Check[]): CheckGroup[] {
  return GROUPS.map((rests) => ({ rests, checks: worstFirst(checks.filter((check) => check.rests === rests)) }))
    .filter((group) => group.checks.length > 0)
}

/** The same checks, worst first; equals keep their order. */
export function worstFirst(checks: readonly Check[]): Check[] {
  return [...checks].sort((one, other) => ORDER.indexOf(one.verdict) - ORDER.indexOf(other.verdict))
}
