import type { Check } from '../contract/record.ts'
import type { LabelLimits } from '../contract/input.ts'
import type { SheetComponent } from '../mix/sheetTypes.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { buildCheck, words } from './buildCheck.ts'
import { labelSource } from './labelSource.ts'
import type { FactMaterial } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'
import { settle } from './settle.ts'

type Limit = NonNullable<LabelLimits['maxRate']>

/** The rate of one component in the label's unit, or null where it cannot be put into it. */
function rateInLabelUnit(component: SheetComponent, share: string, limit: Limit): string | null {
  if (component.perHa === null) return null
  const from = component.inL === null ? 'kg/ha' : 'L/ha'
  if (dimensionOf(from) !== dimensionOf(limit.unit)) return null
  const applied = new ExactDecimal(component.perHa).mul(share)
  return convertQuantity({ value: writeDecimal(applied), unit: from }, limit.unit)
}
/**
 * The most a label allows on a hectare, against what the sheet puts there: `share` of it on the line that got most, named by its block's `code`
 * where the lines differ.
 * @returns null where the label sets no such limit.
 */
export function judgeLabelRate(material: FactMaterial, component: SheetComponent, { share, code }: { share: string; code: string | null }, about: string): Check | null {
  const limit = material.label?.maxRate
  if (!limit) return null
  const base = { code: 'label.rate', rests: 'label', title: words('checks.labelRate.title'), source: labelSource(material), about } as const
  const value = rateInLabelUnit(component, share, limit)
  const named = { material: material.name, limit: roundForReader(limit.value), unit: limit.unit }
  if (value === null) {
    const id = component.amount === null ? 'checks.labelRate.noAmount' : 'checks.labelRate.otherMeasure'
    return buildCheck({ ...base, verdict: 'unknown', text: words(id, named) })
  }
  const isOver = settle(value).gt(limit.value)
  const params = { ...named, value: roundForReader(value, [limit.value]), ...(code !== null && { code }) }
  return buildCheck({
    ...base,
    verdict: isOver ? 'stop' : 'pass',
    text: words(`checks.labelRate.${isOver ? 'over' : 'within'}${code === null ? '' : 'On'}` as const, params),
    figure: words('checks.figure.amount', { value: params.value, unit: limit.unit }),
    band: { low: null, high: params.limit, value: params.value, unit: limit.unit },
  })
}
