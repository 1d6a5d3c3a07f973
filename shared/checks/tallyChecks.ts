import type { Check } from '../contract/record.ts'

export interface Tally {
  stop: number
  caution: number
  unknown: number
}

/** How many stops, cautions and unknowns; passes are never counted. */
export function tallyChecks(checks: readonly Pick<Check, 'verdict'>[]): Tally {
  const count = (verdict: Check['verdict']): number => checks.filter((check) => check.verdict === verdict).length
  return { stop: count('stop'), caution: count('caution'), unknown: count('unknown') }
}
