import type { Lot } from '../contract/input.ts'
import { convertQuantity, type Quantity } from '../units/convertQuantity.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { settle } from './settle.ts'

/** Why a lot is a good choice or a poor one, best first. */
export const LOT_FITNESS = ['fit', 'otherMeasure', 'short', 'past', 'empty'] as const
export type LotFitness = (typeof LOT_FITNESS)[number]

export interface RankedLot {
  lot: Lot
  fitness: LotFitness
  /** What is left of what came in, 0 to 1. */
  leftShare: number
}

function fitnessOf(lot: Lot, need: Quantity | null, usedOn: string): LotFitness {
  const left = new ExactDecimal(lot.left.value)
  if (left.lte(0)) return 'empty'
  if (lot.expiresOn !== null && usedOn > lot.expiresOn) return 'past'
  if (need === null) return 'fit'
  if (dimensionOf(need.unit) !== dimensionOf(lot.left.unit)) return 'otherMeasure'
  return settle(convertQuantity(need, lot.left.unit)).gt(left) ? 'short' : 'fit'
}

function leftShare({ left, quantity }: Lot): number {
  const received = convertQuantity(quantity, left.unit)
  return ExactDecimal.min(1, ExactDecimal.max(0, new ExactDecimal(left.value).div(received))).toNumber()
}

/** What is used first: what runs out of time first, then what came first. */
const turnOf = ({ lot }: RankedLot): string => `${lot.expiresOn ?? '9999'} ${lot.receivedOn} ${lot.code}`

/**
 * Lots of one material in the order a person would take them: fit ones by their date, then those that are short, past their use
 * or empty, each with its reason. None is left out.
 * @param need what the mix takes, null while not known. @param usedOn civil date of use.
 */
export function rankLots(lots: readonly Lot[], { need, usedOn }: { need: Quantity | null; usedOn: string }): RankedLot[] {
  return lots
    .map((lot) => ({ lot, fitness: fitnessOf(lot, need, usedOn), leftShare: leftShare(lot) }))
    .toSorted((one, other) =>
      LOT_FITNESS.indexOf(one.fitness) - LOT_FITNESS.indexOf(other.fitness) || (turnOf(one) < turnOf(other) ? -1 : 1))
}
