import { EACH, type Each } from '../contract/each.ts'
import type { Counts } from '../contract/recordContent.ts'
import { writeDecimal, type ExactDecimal } from '../units/exactDecimal.ts'
import { readPositive } from './readPositive.ts'
import type { SheetCounts } from './sheetTypes.ts'

/** One count of each line, in their order; null where a line lacks it. */
export function countsOf(lines: readonly { counts?: SheetCounts }[], each: Each): (ExactDecimal | null)[] {
  return lines.map(({ counts }) => readPositive(counts?.[each] ?? null))
}

/** What is counted on every line, added up; a count that one line lacks is not known in all, and not there. */
export function addCounts(lines: readonly { counts?: SheetCounts }[]): Counts {
  const sums: Counts = {}
  for (const each of EACH) {
    const sum = sumAll(countsOf(lines, each))
    if (sum) sums[each] = writeDecimal(sum)
  }
  return sums
}

/** Sum of known figures, null where there are none or one is not known. */
export function sumAll(figures: readonly (ExactDecimal | null)[]): ExactDecimal | null {
  let sum: ExactDecimal | null = null
  for (const figure of figures) {
    if (figure === null) return null
    sum = sum ? sum.plus(figure) : figure
  }
  return sum
}
