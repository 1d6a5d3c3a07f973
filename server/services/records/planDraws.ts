import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { AmountUnit } from '../../../shared/contract/quantity.ts'
import type { Computed } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { convertQuantity } from '../../../shared/units/convertQuantity.ts'
import { dimensionOf } from '../../../shared/units/dimensionOf.ts'
import { subtractDecimals } from '../../../shared/units/subtractDecimals.ts'
import type { Lot } from '../../entities/Lot.ts'
import type { FieldError } from '../../errors.ts'
import type { RecordGround } from './loadRecordGround.ts'

/** A component's amount and the lot it came from. */
export interface Draw {
  lot: Lot
  path: string
  amount: { value: string; unit: AmountUnit }
}

/** One taking, in the unit of its lot. */
export interface DrawEntry {
  lot: Lot
  taken: string
  leftAfter: string
  /** Why more was used than the book had, where it was. */
  reason: string | null
}

export interface DrawPlan {
  entries: DrawEntry[]
  /** Impossible: an amount that cannot be counted in the lot's unit. */
  faults: FieldError[]
  /** Unlikely: a lot that holds less than was used. With a reason all that is left is taken, never more. */
  doubts: FieldError[]
}

/** Codes whose reason also covers a lot that is short. */
const SHORT_CODES = ['lot.short', 'lot.left', 'record.stop']

/** What each component takes of its lot: what was really used where that is written, else what the sheet says. */
export function listDraws({ components }: RecordContent, { lots }: Pick<RecordGround, 'lots'>, computed: Computed): Draw[] {
  return components.flatMap(({ lotId, used }, index) => {
    const lot = lots.find(({ id }) => id === lotId)
    const amount = used ?? computed.components[index]?.amount
    return lot && amount ? [{ lot, amount: { value: amount.value, unit: amount.unit }, path: `components.${index}.lotId` }] : []
  })
}

/** What a record takes out of its lots, in the order of its components; pure. */
export function planDraws(draws: Draw[], acknowledged: Acknowledged): DrawPlan {
  const reason = acknowledged.find(({ code }) => SHORT_CODES.includes(code))?.reason ?? null
  const left = new Map(draws.map(({ lot }) => [lot.id, lot.leftQuantity]))
  const plan: DrawPlan = { entries: [], faults: [], doubts: [] }
  for (const { lot, path, amount } of draws) {
    if (dimensionOf(amount.unit) !== dimensionOf(lot.unit)) {
      plan.faults.push({ path, code: 'lot.dimension', params: { code: lot.code, unit: lot.unit } })
      continue
    }
    const needed = convertQuantity(amount, lot.unit)
    const before = left.get(lot.id) ?? '0'
    const after = subtractDecimals(before, needed)
    const isShort = after.startsWith('-')
    if (isShort && reason === null) {
      plan.doubts.push({ path, code: 'lot.short', params: { code: lot.code, left: Number(before), needed: Number(needed), unit: lot.unit } })
    }
    const entry = isShort ? { lot, taken: before, leftAfter: '0', reason } : { lot, taken: needed, leftAfter: after, reason: null }
    left.set(lot.id, entry.leftAfter)
    plan.entries.push(entry)
  }
  return plan
}
