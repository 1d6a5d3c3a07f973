import { ExactDecimal, writeDecimal } from '../units/exactDecimal.ts'
import { siValue } from '../units/siValue.ts'
import { UNITS } from '../units/unitTable.ts'
import { addCounts, sumAll } from './addCounts.ts'
import { componentFigures, perLoad, type SprayFigures } from './componentFigures.ts'
import { divideIntoLoads } from './divideIntoLoads.ts'
import { readSheet, type ReadSheet } from './readSheet.ts'
import { sheetLines, sizedByEach, sumAmounts } from './sheetLines.ts'
import type { RecordSheet, SheetComponent, SheetFinding, SheetInput, SheetLoads } from './sheetTypes.ts'
import { solveSpray, type Spray } from './solveSpray.ts'

/**
 * Every figure of a record: area, counts, water, all the mix, tank loads, each component, each line's share. Worked in exact decimals
 * from what was typed; totals are published at 15 significant digits, and loads and shares add up to them exactly.
 * Components measured by mass add no volume. A draft may be half typed: a figure that cannot be known is null and says why in
 * `findings`; nothing throws.
 * Findings: `sheet.no_area`, `sheet.no_water`, `sheet.tank_needed`, `sheet.count_needed`, `sheet.ratio_needs_water`, `sheet.jar_fixed`,
 * `sheet.too_strong`, `sheet.component_incomplete`, `unit.not_allowed`.
 * @source definitions of ratio, rate and tank mix; see `solveSpray` for the one equation.
 */
export function recordSheet(input: SheetInput): RecordSheet {
  const sheet = readSheet(input)
  const solved = solveSpray(sheet)
  const findings = [...sheet.findings, ...findUnsolved(solved)]
  const writtenM2 = sheet.lineAreasM2.reduce((sum, area) => sum.plus(area), ZERO)
  const areaHa = sheet.areaM2 && sheet.areaM2.div(M2_PER_HA)
  const totalL = solved.totalL?.gt(0) ? solved.totalL.toSignificantDigits(15) : null
  const loads = !sheet.isDry && totalL && sheet.tankL && areaHa && divideIntoLoads(totalL, sheet.tankL)
  const spray: SprayFigures = {
    areaM2: sheet.areaM2, areaHa, counts: sheet.counts, waterL: solved.waterL, totalL: solved.totalL, tankL: sheet.tankL, loads: loads || null,
  }
  const components = sheet.bases.map((basis) => componentFigures(basis, spray))
  const totalKg = sumMass(sheet, components)
  const lines = sheetLines(input, sheet, { totalL, totalKg }, findings)
  return {
    areaM2: round(writtenM2),
    areaHa: round(writtenM2.div(M2_PER_HA)),
    counts: addCounts(input.lines),
    waterL: sheet.isDry ? null : solved.waterL && round(solved.waterL),
    totalL: totalL && round(totalL),
    totalKg: totalKg && round(totalKg),
    sprayLPerHa: totalL && areaHa && round(totalL.div(areaHa)),
    kgPerHa: totalKg && areaHa && round(totalKg.div(areaHa)),
    sprayPerEach: presentPerEach(sheet, totalL),
    loads: presentLoads(spray, sheet.flowLPerMin),
    components,
    water: { perHa: solved.waterL && areaHa && writeDecimal(solved.waterL.div(areaHa)), ...perLoad(solved.waterL, spray) },
    appliedL: sumAmounts(lines, 'amountL'),
    appliedKg: sumAmounts(lines, 'amountKg'),
    lines,
    findings,
  }
}

const ZERO = new ExactDecimal(0)
const M2_PER_HA = UNITS.ha.toSi[0]
const round = (value: ExactDecimal): number => Number(writeDecimal(value))

function findUnsolved({ isTooStrong, isJarFixed }: Spray): SheetFinding[] {
  return [
    ...(isTooStrong ? [{ code: 'sheet.too_strong', params: {} }] : []),
    ...(isJarFixed ? [{ code: 'sheet.jar_fixed', params: {}, path: 'water' }] : []),
  ]
}

function sumMass({ bases }: ReadSheet, components: readonly SheetComponent[]): ExactDecimal | null {
  const weighed = components.filter((_, index) => bases[index]?.isLiquid === false)
  const sum = sumAll(weighed.map(({ amount }) => amount && siValue(new ExactDecimal(amount.value), amount.unit)))
  return sum && sum.toSignificantDigits(15)
}

function presentPerEach(sheet: ReadSheet, totalL: ExactDecimal | null): RecordSheet['sprayPerEach'] {
  const each = sizedByEach(sheet)
  const count = each && sheet.counts[each]
  return each && count && totalL && { each, litres: round(totalL.div(count)) }
}

function presentLoads({ loads, tankL, totalL, areaHa }: SprayFigures, flowLPerMin: ExactDecimal | null): SheetLoads | null {
  if (!loads || !tankL || !totalL || !areaHa) return null
  const { full, lastL } = loads
  return {
    full,
    count: full + (lastL.gt(0) ? 1 : 0),
    tankL: round(tankL),
    lastL: round(lastL),
    lastAreaHa: round(lastL.times(areaHa).div(totalL)),
    fullMinutes: flowLPerMin && full > 0 ? round(tankL.div(flowLPerMin)) : null,
    lastMinutes: flowLPerMin && lastL.gt(0) ? round(lastL.div(flowLPerMin)) : null,
  }
}
