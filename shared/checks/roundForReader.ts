import { settle } from './settle.ts'

const MOST_DIGITS = 12

/**
 * A figure as a reader sees it: four significant digits unless told, or as many more as it takes to look different from the limit it is
 * judged against, so that nothing reads "2 is over 2".
 * @param value plain decimal text or a number. @param limits plain decimal texts in the same unit.
 */
export function roundForReader(value: string | number, limits: readonly string[] = [], least = 4): number {
  const exact = settle(value)
  for (let digits = least; digits < MOST_DIGITS; digits += 1) {
    const rounded = exact.toSignificantDigits(digits)
    const blurred = limits.some((limit) => rounded.cmp(limit) !== exact.cmp(limit))
    if (!blurred) return rounded.toNumber()
  }
  return exact.toNumber()
}
