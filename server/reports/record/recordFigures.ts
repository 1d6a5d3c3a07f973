import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'

/** What the sheet gives for a signed record today, and whether it still gives what was signed. */
export interface RecordFigures { sheet: RecordSheet; agrees: boolean }

/** Works the sheet out again from what was signed. */
export function recordFigures(signed: SignedRecord): RecordFigures {
  const { content, blocks, sprayer } = signed
  const sheet = recordSheet({
    lines: content.lines.map(({ blockId, amount }) => ({
      areaM2: Number(blocks.find(({ id }) => id === blockId)?.areaM2 ?? 0),
      amount,
    })),
    water: content.water,
    tankL: sprayer?.tankL ?? null,
    components: content.components,
  })
  return { sheet, agrees: agreesWithSigned(sheet, signed.computed) }
}

function agreesWithSigned(sheet: RecordSheet, computed: SignedRecord['computed']): boolean {
  const pairs: [string | number | null | undefined, string | number | null | undefined][] = [
    [sheet.areaM2, computed.areaM2],
    [sheet.totalL, computed.totalL],
    [sheet.waterL, computed.waterL],
    [sheet.sprayLPerHa, computed.sprayLPerHa],
    [sheet.loads?.full, computed.loads?.full],
    [sheet.loads?.lastL, computed.loads?.lastL],
    [sheet.loads?.tankL, computed.loads?.tankL],
    ...computed.components.map(({ amount }, index): [string | undefined, string] =>
      [sheet.components[index]?.amount?.value, amount.value]),
  ]
  const units = computed.components.every(({ amount }, index) => sheet.components[index]?.amount?.unit === amount.unit)
  return units && pairs.every(([today, then]) => isSameFigure(today, then))
}

/** Same to twelve digits, which is finer than anything that is printed. */
function isSameFigure(a: string | number | null | undefined, b: string | number | null | undefined): boolean {
  if (a === null || a === undefined || b === null || b === undefined) return (a ?? null) === (b ?? null)
  return Number(a).toPrecision(12) === Number(b).toPrecision(12)
}
