import { VERDICTS, type Check } from '../contract/record.ts'

/** The same checks, worst verdict first; equals keep their order. */
export function worstFirst(checks: readonly Check[]): Check[] {
  return checks.toSorted(byVerdict)
}

/** Below zero where the first is the worse: stop, caution, not known, pass. */
export function byVerdict(one: Pick<Check, 'verdict'>, other: Pick<Check, 'verdict'>): number {
  return VERDICTS.indexOf(one.verdict) - VERDICTS.indexOf(other.verdict)
}
