import { recordChecks } from '../../../shared/checks/recordChecks.ts'
import type { Check, Computed, RecordContent } from '../../../shared/contract/record.ts'
import { recordSheet } from '../../../shared/mix/recordSheet.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { presentLot } from '../inputs/presentInputs.ts'
import type { RecordGround } from './loadRecordGround.ts'

export interface JudgedRecord {
  sheet: RecordSheet
  computed: Computed
  checks: Check[]
}

/** The figures and checks of a record over what it rests on, at an instant. */
export function judgeRecord(content: RecordContent, ground: RecordGround, zone: string, now: Date): JudgedRecord {
  const sheet = recordSheet({
    lines: content.lines.map(({ blockId, amount }) => ({
      areaM2: Number(ground.blocks.find(({ id }) => id === blockId)?.areaM2 ?? 0),
      amount,
    })),
    water: content.water,
    tankL: ground.sprayer?.tankL ?? null,
    components: content.components,
  })
  const checks = recordChecks({
    content,
    sheet,
    blocks: ground.blocks,
    materials: ground.materials,
    lots: ground.lots.map((lot) => presentLot(lot, '')),
    zone,
    now: now.toISOString(),
  })
  return { sheet, computed: presentComputed(sheet), checks }
}

function presentComputed(sheet: RecordSheet): Computed {
  return {
    areaM2: sheet.areaM2,
    totalL: sheet.totalL,
    waterL: sheet.waterL,
    sprayLPerHa: sheet.sprayLPerHa,
    loads: sheet.loads && {
      full: sheet.loads.full,
      tankL: sheet.loads.tankL,
      lastL: sheet.loads.lastL,
      lastAreaHa: sheet.loads.lastAreaHa,
    },
    components: sheet.components.map(({ amount }) => ({ amount: amount as Computed['components'][number]['amount'] })),
  }
}
