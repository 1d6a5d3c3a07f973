import { judgeLikely } from '../../../shared/checks/judgeLikely.ts'
import { recordChecks } from '../../../shared/checks/recordChecks.ts'
import type { Check, Computed } from '../../../shared/contract/record.ts'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { presentComputed } from '../../../shared/records/presentComputed.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { presentLot } from '../inputs/presentInputs.ts'
import type { RecordGround } from './loadRecordGround.ts'

export interface JudgedRecord {
  sheet: RecordSheet
  computed: Computed
  checks: Check[]
}

/** The figures and checks of a record over what it rests on, at an instant. */
export function judgeRecord(content: RecordContent, ground: RecordGround, zone: string, now: Date): JudgedRecord {
  const sheet = sheetOf(content, ground)
  const checks = recordChecks({
    content,
    sheet,
    blocks: ground.blocks,
    materials: ground.materials,
    lots: ground.lots.map((lot) => presentLot(lot, '')),
    sprayer: ground.sprayer && { code: ground.sprayer.code, calibration: ground.calibration },
    zone,
    now: now.toISOString(),
  }, judgeLikely)
  return { sheet, computed: presentComputed({ content, sheet, materials: ground.materials, zone }), checks }
}
