import { ExactDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS } from '../units/unitTable.ts'
import type { ReadBasis } from './readBasis.ts'
import type { ReadSheet } from './readSheet.ts'

export interface Spray {
  waterL: ExactDecimal | null
  totalL: ExactDecimal | null
  /** The liquid components alone are as much as the spray, or more. */
  isTooStrong: boolean
}

/** What the liquid components add: `r` litres a litre of water, `A` litres, `p` litres a litre of spray; null where not known. */
interface Added { r: ExactDecimal | null; A: ExactDecimal | null; p: ExactDecimal | null }

/**
 * Carrier water W and all the spray T, litres, from whichever was given. With r = Σ 1/N of the ratios, A the litres of the rates
 * over the area and p = Σ (litres a full tank)/tank:  T = W(1 + r) + A + pT.
 * Components measured by mass add no volume.
 * @source definition: the spray is its water and its liquid components.
 */
export function solveSpray(sheet: ReadSheet): Spray {
  const { r, A, p } = addUp(sheet)
  const isFull = p !== null && p.gte(1)
  if (sheet.water === null) return { waterL: null, totalL: null, isTooStrong: isFull }
  if (sheet.water.sizedFrom === 'water') {
    const waterL = sheet.water.si
    const isKnown = r !== null && A !== null && p !== null && !isFull
    const totalL = isKnown ? waterL.times(r.plus(1)).plus(A).div(ONE.minus(p)) : null
    return { waterL, totalL, isTooStrong: isFull }
  }
  const totalL = sheet.areaM2 && sheet.water.si.times(sheet.areaM2).div(UNITS.ha.toSi[0])
  if (totalL === null || r === null || A === null || p === null) return { waterL: null, totalL, isTooStrong: isFull }
  const waterL = totalL.times(ONE.minus(p)).minus(A).div(r.plus(1))
  const isTooStrong = isFull || waterL.lt(0)
  return { waterL: isTooStrong ? null : waterL, totalL, isTooStrong }
}

const ONE = new ExactDecimal(1)

function addUp({ bases, areaM2, tankL }: ReadSheet): Added {
  const liquids = bases.filter((basis) => basis.isLiquid)
  if (liquids.some((basis) => basis.kind === 'unknown')) return { r: null, A: null, p: null }
  return {
    r: sum(liquids, (basis) => (basis.kind === 'ratio' ? ONE.div(basis.parts) : ZERO)),
    A: sum(liquids, (basis) => (basis.kind !== 'perArea' ? ZERO : amountOver(areaM2, basis))),
    p: sum(liquids, (basis) => (basis.kind !== 'perTank' ? ZERO : tankL && siValue(basis.value, basis.unit).div(tankL))),
  }
}

const ZERO = new ExactDecimal(0)

function amountOver(areaM2: ExactDecimal | null, basis: ReadBasis & { kind: 'perArea' }): ExactDecimal | null {
  return areaM2 && siValue(basis.value.times(areaM2).div(basis.groundM2), basis.unit)
}

function sum(bases: ReadBasis[], litres: (basis: ReadBasis) => ExactDecimal | null): ExactDecimal | null {
  let total: ExactDecimal | null = ZERO
  for (const basis of bases) {
    const part = litres(basis)
    total = total && part && total.plus(part)
  }
  return total
}
