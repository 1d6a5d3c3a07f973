import type { KnownAmount } from '../contract/quantity.ts'
import type { SheetComponent } from '../mix/sheetTypes.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'

/** A component by what was really taken of it, where that was written down and can be set beside the sheet's amount. */
export function asUsed(component: SheetComponent, used: Pick<KnownAmount, 'value' | 'unit'> | null | undefined): SheetComponent {
  const { amount, inL, inKg, perHa } = component
  if (!used || amount === null || dimensionOf(used.unit) !== dimensionOf(amount.unit) || new ExactDecimal(amount.value).isZero()) return component
  const value = convertQuantity({ value: used.value, unit: used.unit }, amount.unit)
  const scale = (figure: string | null): string | null => (figure === null ? null : writeDecimal(new ExactDecimal(figure).mul(value).div(amount.value)))
  return { ...component, amount: { value, unit: amount.unit }, inL: scale(inL), inKg: scale(inKg), perHa: scale(perHa) }
}
