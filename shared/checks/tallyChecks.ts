import type { Check } from '../contract/record.ts'

/** The verdicts that are counted, worst first. */
export const TALLIED = ['stop', 'caution', 'unknown'] as const

export type Tally = Record<(typeof TALLIED)[number], number>

/** How many stops, cautions and unknowns; passes are never counted. */
export function tallyChecks(checks: readonly Pick<Check, 'verdict'>[]): Tally {
  const count = (verdict: Check['verdict']): number => checks.filter((check) => check.verdict === verdict).length
  return { stop: count('stop'), caution: count('caution'), unknown: count('unknown') }
}
