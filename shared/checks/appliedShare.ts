import { ExactDecimal } from '../units/exactDecimal.ts'
import type { RecordFacts } from './recordFacts.ts'

/**
 * How much of the spray that the sheet sizes went onto the land: the amounts measured or counted on the block lines over the sheet's total. An amount
 * that was worked out is the sheet's own, rounded for reading, so it says nothing new.
 * @returns a plain decimal, 1 unless every line has such an amount by volume and the sheet a total.
 */
export function appliedShare({ content, sheet }: Pick<RecordFacts, 'content' | 'sheet'>): string {
  const { lines, totalL } = sheet
  if (content.lines.some(({ amount }) => amount === null || amount.known === 'workedOut')) return '1'
  if (totalL === null || totalL <= 0 || lines.length === 0) return '1'
  let applied = new ExactDecimal(0)
  for (const { amountL } of lines) {
    if (amountL === null) return '1'
    applied = applied.plus(amountL)
  }
  return applied.div(totalL).toFixed()
}
