import type { RecordContent } from '../contract/recordContent.ts'
import { convertQuantity, type Quantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'

/** What went on all the lines together, in L or kg; null where a line says nothing, or lines say it in volume and in mass. */
export function sumOnLand(lines: readonly Pick<RecordContent['lines'][number], 'amount'>[]): Quantity | null {
  const amounts = lines.flatMap(({ amount }) => amount ?? [])
  const [first] = amounts
  if (first === undefined || amounts.length < lines.length) return null
  const unit = dimensionOf(first.unit) === 'volume' ? 'L' : 'kg'
  if (amounts.some((amount) => dimensionOf(amount.unit) !== dimensionOf(unit))) return null
  return { value: writeDecimal(amounts.reduce((sum, amount) => sum.plus(convertQuantity(amount, unit)), new ExactDecimal(0))), unit }
}
