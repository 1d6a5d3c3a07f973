import { lineHolds } from '../checks/labelHolds.ts'
import type { FactMaterial } from '../checks/recordFacts.ts'
import { amountUnit } from '../contract/quantity.ts'
import type { Computed } from '../contract/record.ts'
import type { RecordContent } from '../contract/recordContent.ts'
import type { RecordSheet } from '../mix/sheetTypes.ts'
import { ExactDecimal } from '../units/exactDecimal.ts'
import { airOf } from '../weather/airOf.ts'
import { M2_PER_HA } from '../units/hectare.ts'


/** The sheet's figures, the holds that follow and what the weather comes to, as the contract shows them. */
export function presentComputed(
  { content, sheet, materials, zone }: { content: RecordContent; sheet: RecordSheet; materials: readonly FactMaterial[]; zone: string },
): Computed {
  const { areaM2, counts, totalL, totalKg, waterL, sprayLPerHa, kgPerHa, sprayPerEach, loads } = sheet
  return {
    areaM2, counts, totalL, totalKg, waterL, sprayLPerHa, kgPerHa, sprayPerEach,
    loads: loads && {
      full: loads.full, tankL: loads.tankL, lastL: loads.lastL, lastAreaHa: loads.lastAreaHa,
      fullMinutes: loads.fullMinutes, lastMinutes: loads.lastMinutes,
    },
    components: sheet.components.map(({ amount }) => ({ amount: amount && { value: amount.value, unit: amountUnit.parse(amount.unit) } })),
    lines: sheet.lines.map(({ areaHa, shareL, shareKg }, index) => ({
      areaM2: new ExactDecimal(areaHa).times(M2_PER_HA).toNumber(),
      shareL, shareKg,
      ...lineHolds({ endedAt: content.lines[index]?.endedAt ?? null }, materials, zone),
    })),
    air: airOf(content.weather),
  }
}
