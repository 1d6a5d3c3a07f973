import type { Each } from '../contract/each.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'
import { countsOf } from './addCounts.ts'
import { readPositive } from './readPositive.ts'
import type { ReadSheet } from './readSheet.ts'
import { shareOut } from './shareOut.ts'
import type { SheetFinding, SheetInput, SheetLine } from './sheetTypes.ts'

type LineAmount = Pick<SheetLine, 'amountL' | 'amountKg'>

/** Each line's area, its share of the mix and the amount written down on it. */
export function sheetLines(
  input: SheetInput, sheet: ReadSheet, { totalL, totalKg }: { totalL: ExactDecimal | null; totalKg: ExactDecimal | null }, findings: SheetFinding[],
): SheetLine[] {
  const weights = shareWeights(input, sheet)
  const litres = totalL && weights && shareOut(totalL, weights)
  const kilograms = totalKg && weights && shareOut(totalKg, weights)
  return sheet.lineAreasM2.map((areaM2, index) => {
    return {
      areaHa: Number(writeDecimal(areaM2.div(UNITS.ha.toSi[0]))),
      shareL: litres?.[index]?.toFixed() ?? null,
      shareKg: kilograms?.[index]?.toFixed() ?? null,
      ...readAmount(input.lines[index]?.amount, `lines.${index}.amount`, findings),
    }
  })
}

/** Counts where the mix is sized by them, else areas; null while one of them is missing. */
function shareWeights({ lines }: SheetInput, sheet: ReadSheet): ExactDecimal[] | null {
  const each = sizedByEach(sheet)
  if (each === null) return sheet.areaM2 && sheet.lineAreasM2
  const counts = countsOf(lines, each).filter((count) => count !== null)
  return counts.length > 0 && counts.length === lines.length ? counts : null
}

/** What the mix is counted out by: as it is sized, or as all of its components are measured where there is no water. */
export function sizedByEach({ water, bases }: Pick<ReadSheet, 'water' | 'bases'>): Each | null {
  if (water?.sizedFrom === 'perEach') return water.each
  if (water?.sizedFrom !== 'water' || water.si.gt(0)) return null
  const [first] = bases
  if (first?.kind !== 'perEach') return null
  return bases.every((basis) => basis.kind === 'perEach' && basis.each === first.each) ? first.each : null
}

/** Sum of what is written on the lines, one measure; null until each line says one. */
export function sumAmounts<Key extends keyof LineAmount>(lines: readonly Pick<LineAmount, Key>[], key: Key): string | null {
  if (lines.length === 0) return null
  let sum = new ExactDecimal(0)
  for (const line of lines) {
    const amount = line[key]
    if (amount === null) return null
    sum = sum.plus(amount)
  }
  return writeDecimal(sum)
}

/** What is written on a line, by its measure. */
export function readAmount(amount: SheetInput['lines'][number]['amount'], path: string, findings: SheetFinding[]): LineAmount {
  const none = { amountL: null, amountKg: null }
  if (!amount) return none
  const dimension = Object.hasOwn(UNITS, amount.unit) ? dimensionOf(amount.unit as UnitCode) : null
  if (dimension !== 'volume' && dimension !== 'mass') {
    findings.push({ code: 'unit.not_allowed', params: { unit: amount.unit }, path })
    return none
  }
  const value = readPositive(amount.value)
  return value === null ? none : { ...none, [dimension === 'volume' ? 'amountL' : 'amountKg']: writeDecimal(siValue(value, amount.unit as UnitCode)) }
}
