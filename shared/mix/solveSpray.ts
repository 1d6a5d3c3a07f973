import { ExactDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS } from '../units/unitTable.ts'
import type { ReadBasis } from './readBasis.ts'
import type { ReadSheet } from './readSheet.ts'
import type { ReadWater } from './readWater.ts'

export interface Spray {
  waterL: ExactDecimal | null
  totalL: ExactDecimal | null
  /** The liquid components alone are as much as the mix, or more. */
  isTooStrong: boolean
  /** The jar that should size the mix is measured out without regard to the water. */
  isJarFixed: boolean
}

/** What the liquid components add: `r` litres a litre of water, `A` litres, `p` litres a litre of mix; null where not known. */
interface Added { r: ExactDecimal | null; A: ExactDecimal | null; p: ExactDecimal | null }

/**
 * Carrier water W and all the mix T, litres, from whichever was given. With r = Σ 1/N of the ratios "to N", A the litres of the rates
 * over area and count and of what is given in all, and p = Σ (litres a full tank)/tank + Σ 1/N of the ratios "in N":
 * T = W(1 + r) + A + pT. Components measured by mass add no volume.
 * @source definition: the mix is its water and its liquid components.
 */
export function solveSpray(sheet: ReadSheet): Spray {
  const { r, A, p } = addUp(sheet)
  const isFull = p !== null && p.gte(1)
  const unknown = { waterL: null, totalL: null, isTooStrong: isFull, isJarFixed: false }
  if (sheet.water === null) return unknown
  const given = readGiven(sheet, sheet.water)
  if (given === 'fixed') return { ...unknown, isJarFixed: true }
  if (given === null) return unknown
  if ('waterL' in given) {
    const { waterL } = given
    const isKnown = r !== null && A !== null && p !== null && !isFull
    const totalL = isKnown ? waterL.times(r.plus(1)).plus(A).div(ONE.minus(p)) : null
    return { ...unknown, waterL, totalL }
  }
  const { totalL } = given
  if (r === null || A === null || p === null) return { ...unknown, totalL }
  const waterL = totalL.times(ONE.minus(p)).minus(A).div(r.plus(1))
  const isTooStrong = isFull || waterL.lt(0)
  return { ...unknown, waterL: isTooStrong ? null : waterL, totalL, isTooStrong }
}

const ONE = new ExactDecimal(1)
const ZERO = new ExactDecimal(0)

/** What the water's line says of the mix: its water, its total, or nothing yet; `fixed` where the jar it names does not depend on either. */
function readGiven(sheet: ReadSheet, water: ReadWater): { waterL: ExactDecimal } | { totalL: ExactDecimal } | 'fixed' | null {
  switch (water.sizedFrom) {
    case 'water':
      return { waterL: water.si }
    case 'sprayRate':
      return sheet.areaM2 && { totalL: water.si.times(sheet.areaM2).div(UNITS.ha.toSi[0]) }
    case 'perEach': {
      const count = sheet.counts[water.each]
      return count && { totalL: water.si.times(count) }
    }
    case 'jar':
      return readJar(sheet, water)
  }
}

function readJar({ bases, tankL }: ReadSheet, { component, si, isLiquid }: ReadWater & { sizedFrom: 'jar' }): ReturnType<typeof readGiven> {
  const basis = bases[component]
  if (!basis || basis.kind === 'unknown' || basis.isLiquid !== isLiquid) return null
  if (basis.kind === 'ratio') return basis.reading === 'to' ? { waterL: si.times(basis.parts) } : { totalL: si.times(basis.parts) }
  if (basis.kind === 'perTank') return tankL && { totalL: si.times(tankL).div(siValue(basis.value, basis.unit)) }
  return 'fixed'
}

function addUp(sheet: ReadSheet): Added {
  const liquids = sheet.bases.filter((basis) => basis.isLiquid)
  if (liquids.some((basis) => basis.kind === 'unknown')) return { r: null, A: null, p: null }
  return {
    r: sum(liquids, (basis) => (basis.kind === 'ratio' && basis.reading === 'to' ? ONE.div(basis.parts) : ZERO)),
    A: sum(liquids, (basis) => fixedLitres(sheet, basis)),
    p: sum(liquids, (basis) => shareOfMix(sheet, basis)),
  }
}

function fixedLitres({ areaM2, counts }: ReadSheet, basis: ReadBasis): ExactDecimal | null {
  switch (basis.kind) {
    case 'perArea':
      return areaM2 && siValue(basis.value.times(areaM2).div(basis.groundM2), basis.unit)
    case 'perEach': {
      const count = counts[basis.each]
      return count && siValue(basis.value.times(count), basis.unit)
    }
    case 'total':
      return siValue(basis.value, basis.unit)
    default:
      return ZERO
  }
}

function shareOfMix({ tankL }: ReadSheet, basis: ReadBasis): ExactDecimal | null {
  if (basis.kind === 'ratio') return basis.reading === 'in' ? ONE.div(basis.parts) : ZERO
  return basis.kind === 'perTank' ? tankL && siValue(basis.value, basis.unit).div(tankL) : ZERO
}

function sum(bases: ReadBasis[], litres: (basis: ReadBasis) => ExactDecimal | null): ExactDecimal | null {
  let total: ExactDecimal | null = ZERO
  for (const basis of bases) {
    const part = litres(basis)
    total = total && part && total.plus(part)
  }
  return total
}
