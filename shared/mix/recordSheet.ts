import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { dimensionOf } from '../units/dimensionOf.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS, type UnitCode } from '../units/unitTable.ts'
import { componentFigures, perLoad, type SprayFigures } from './componentFigures.ts'
import { divideIntoLoads } from './divideIntoLoads.ts'
import { readPositive } from './readPositive.ts'
import { readSheet } from './readSheet.ts'
import { shareByArea } from './shareByArea.ts'
import type { RecordSheet, SheetFinding, SheetInput, SheetLine, SheetLoads } from './sheetTypes.ts'
import { solveSpray } from './solveSpray.ts'

/**
 * Every figure of a record: area, water, all the spray, tank loads, each component, each line's share. Worked in exact decimals
 * from what was typed; the total is published at 15 significant digits, and loads and shares add up to it exactly.
 * Components measured by mass add no volume. A draft may be half typed: a figure that cannot be known is null and says why in
 * `findings`; nothing throws.
 * Findings: `sheet.no_area`, `sheet.no_water`, `sheet.tank_needed`, `sheet.too_strong`, `sheet.component_incomplete`,
 * `unit.not_allowed`.
 * @source definitions of ratio, rate and tank mix; see `solveSpray` for the one equation.
 */
export function recordSheet(input: SheetInput): RecordSheet {
  const sheet = readSheet(input)
  const solved = solveSpray(sheet)
  const findings = [...sheet.findings]
  if (solved.isTooStrong) findings.push({ code: 'sheet.too_strong', params: {} })
  const writtenM2 = sheet.lineAreasM2.reduce((sum, area) => sum.plus(area), ZERO)
  const areaHa = sheet.areaM2 && sheet.areaM2.div(M2_PER_HA)
  const totalL = solved.totalL && solved.totalL.toSignificantDigits(15)
  const loads = totalL && sheet.tankL && areaHa && divideIntoLoads(totalL, sheet.tankL)
  const spray: SprayFigures = {
    areaM2: sheet.areaM2, areaHa, waterL: solved.waterL, totalL: solved.totalL, tankL: sheet.tankL, loads,
  }
  const lines = presentLines(input, sheet.lineAreasM2, totalL && sheet.areaM2 ? totalL : null, findings)
  return {
    areaM2: round(writtenM2),
    areaHa: round(writtenM2.div(M2_PER_HA)),
    waterL: solved.waterL && round(solved.waterL),
    totalL: totalL && round(totalL),
    sprayLPerHa: solved.totalL && areaHa && round(solved.totalL.div(areaHa)),
    loads: presentLoads(spray),
    components: sheet.bases.map((basis) => componentFigures(basis, spray)),
    water: { perHa: solved.waterL && areaHa && writeDecimal(solved.waterL.div(areaHa)), ...perLoad(solved.waterL, spray) },
    appliedL: sumAmounts(lines),
    lines,
    findings,
  }
}

const ZERO = new ExactDecimal(0)
const M2_PER_HA = UNITS.ha.toSi[0]
const round = (value: ExactDecimal): number => Number(writeDecimal(value))

function presentLoads({ loads, tankL, totalL, areaHa }: SprayFigures): SheetLoads | null {
  if (!loads || !tankL || !totalL || !areaHa) return null
  const { full, lastL } = loads
  return {
    full,
    count: full + (lastL.gt(0) ? 1 : 0),
    tankL: round(tankL),
    lastL: round(lastL),
    lastAreaHa: round(lastL.times(areaHa).div(totalL)),
  }
}

function presentLines(
  input: SheetInput, areasM2: readonly ExactDecimal[], totalL: ExactDecimal | null, findings: SheetFinding[],
): SheetLine[] {
  const shares = totalL && shareByArea(totalL, areasM2)
  return areasM2.map((areaM2, index) => ({
    areaHa: round(areaM2.div(M2_PER_HA)),
    shareL: shares?.[index]?.toFixed() ?? null,
    amountL: readAmountL(input.lines[index]?.amount, `lines.${index}.amount`, findings),
  }))
}

function sumAmounts(lines: readonly SheetLine[]): string | null {
  if (lines.length === 0) return null
  let sum = ZERO
  for (const { amountL } of lines) {
    if (amountL === null) return null
    sum = sum.plus(amountL)
  }
  return writeDecimal(sum)
}

function readAmountL(amount: SheetInput['lines'][number]['amount'], path: string, findings: SheetFinding[]): string | null {
  if (!amount) return null
  if (!Object.hasOwn(UNITS, amount.unit) || dimensionOf(amount.unit) !== 'volume') {
    findings.push({ code: 'unit.not_allowed', params: { unit: amount.unit }, path })
    return null
  }
  const value = readPositive(amount.value)
  return value && writeDecimal(siValue(value, amount.unit as UnitCode))
}
