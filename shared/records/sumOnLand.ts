import type { RecordContent } from '../contract/recordContent.ts'
import { readAmount, sumAmounts } from '../mix/sheetLines.ts'
import type { Quantity } from '../units/convertQuantity.ts'

/** What went on all the lines together, in L or kg; null where a line says nothing, or lines say it in volume and in mass. */
export function sumOnLand(lines: readonly Pick<RecordContent['lines'][number], 'amount'>[]): Quantity | null {
  const written = lines.map(({ amount }) => readAmount(amount, '', []))
  const litres = sumAmounts(written, 'amountL')
  if (litres !== null) return { value: litres, unit: 'L' }
  const kilograms = sumAmounts(written, 'amountKg')
  return kilograms === null ? null : { value: kilograms, unit: 'kg' }
}
