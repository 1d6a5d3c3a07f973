import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { M2_PER_HA } from '../../../shared/units/hectare.ts'

/** What the sheet gives for a signed record today, and whether it still gives what was signed. */
export interface RecordFigures { sheet: RecordSheet; agrees: boolean }

/** Works the sheet out again from what was signed. */
export function recordFigures(signed: SignedRecord): RecordFigures {
  const { content, blocks, sprayer } = signed
  const sheet = sheetOf(content, { blocks, sprayer })
  return { sheet, agrees: agreesWithSigned(sheet, signed.computed) }
}

type Pair = [today: string | number | null | undefined, then: string | number | null | undefined]

function agreesWithSigned(sheet: RecordSheet, computed: SignedRecord['computed']): boolean {
  const pairs: Pair[] = [
    [sheet.areaM2, computed.areaM2],
    [sheet.totalL, computed.totalL],
    [sheet.waterL, computed.waterL],
    [sheet.sprayLPerHa, computed.sprayLPerHa],
    [sheet.loads?.full, computed.loads?.full],
    [sheet.loads?.lastL, computed.loads?.lastL],
    [sheet.loads?.tankL, computed.loads?.tankL],
    ...computed.components.map(({ amount }, index): Pair => [sheet.components[index]?.amount?.value, amount.value]),
    ...newerPairs(sheet, computed),
  ]
  const units = computed.components.every(({ amount }, index) => sheet.components[index]?.amount?.unit === amount.unit)
  return units && pairs.every(([today, then]) => isSameFigure(today, then))
}

/** Figures that the first schema did not hold: there were no lines in it. */
function newerPairs(sheet: RecordSheet, computed: SignedRecord['computed']): Pair[] {
  if (computed.lines.length === 0) return []
  return [
    [sheet.totalKg, computed.totalKg],
    [sheet.kgPerHa, computed.kgPerHa],
    [sheet.sprayPerEach?.litres, computed.sprayPerEach?.litres],
    [sheet.loads?.fullMinutes, computed.loads?.fullMinutes],
    [sheet.loads?.lastMinutes, computed.loads?.lastMinutes],
    ...computed.lines.flatMap(({ areaM2, shareL, shareKg }, index): Pair[] => {
      const line = sheet.lines[index]
      return [[line && line.areaHa * M2_PER_HA, areaM2], [line?.shareL, shareL], [line?.shareKg, shareKg]]
    }),
  ]
}


/** Same to twelve digits, which is finer than anything that is printed. */
function isSameFigure(...[a, b]: Pair): boolean {
  if (a === null || a === undefined || b === null || b === undefined) return (a ?? null) === (b ?? null)
  return Number(a).toPrecision(12) === Number(b).toPrecision(12)
}
