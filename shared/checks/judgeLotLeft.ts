import type Decimal from 'decimal.js'
import type { Check } from '../contract/record.ts'
import type { SheetComponent } from '../mix/sheetTypes.ts'
import { convertQuantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import type { UnitCode } from '../units/unitTable.ts'
import { buildCheck, words } from './buildCheck.ts'
import type { FactLot } from './recordFacts.ts'
import { roundForReader } from './roundForReader.ts'
import { settle } from './settle.ts'

/** What the components take of one lot, in the lot's unit; null where one of them cannot be said in it. */
function takenFrom(lot: FactLot, components: readonly SheetComponent[]): Decimal | 'noAmount' | 'otherMeasure' {
  const unit: UnitCode = lot.left.unit
  let taken: Decimal = new ExactDecimal(0)
  for (const { amount } of components) {
    if (amount === null) return 'noAmount'
    if (dimensionOf(amount.unit) !== dimensionOf(unit)) return 'otherMeasure'
    taken = taken.plus(convertQuantity(amount, unit))
  }
  return taken
}

/**
 * Whether a lot still holds what the mix takes of it, all components that come from it together.
 * @param components those that come from this lot.
 */
export function judgeLotLeft(lot: FactLot, components: readonly SheetComponent[], about: string): Check {
  const base = { code: 'lot.left', rests: 'house', title: words('checks.lotLeft.title', { lot: lot.code }), about } as const
  const left = { left: roundForReader(lot.left.value), unit: lot.left.unit }
  const taken = takenFrom(lot, components)
  if (typeof taken === 'string') return buildCheck({ ...base, verdict: 'unknown', text: words(`checks.lotLeft.${taken}`, left) })
  const rest = new ExactDecimal(lot.left.value).minus(settle(taken))
  const params = { ...left, taken: roundForReader(taken.toFixed(), [lot.left.value]) }
  // Of the figures as they are read: a reader who adds them up finds no gap.
  const apart = new ExactDecimal(params.left).minus(params.taken).abs().toNumber()
  const figure = words('checks.figure.amount', { value: params.taken, unit: lot.left.unit })
  return rest.lt(0)
    ? buildCheck({ ...base, figure, verdict: 'stop', text: words('checks.lotLeft.short', { ...params, short: apart }) })
    : buildCheck({ ...base, figure, verdict: 'pass', text: words('checks.lotLeft.enough', { ...params, rest: apart }) })
}
