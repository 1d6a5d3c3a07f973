import type { EntityManager } from 'typeorm'
import type { RecordContent } from '../../../shared/contract/recordContent.ts'
import { firstStart, registerRow } from '../../../shared/records/registerRow.ts'
import type { FarmActor } from '../../database/actor.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { invalid } from '../../errors.ts'
import { findDoer } from './assertMayWrite.ts'
import { findEndedFaults } from './findEndedFaults.ts'
import { findRecordFaults } from './findRecordFaults.ts'
import { judgeRecord } from './judgeRecord.ts'
import { loadRecordGround } from './loadRecordGround.ts'

/** The columns of an unsigned record that follow from what was written. */
export type DraftColumns = Pick<ApplicationRecord, 'state' | 'content' | 'computed' | 'checks' | 'registerRow' | 'sortAt' | 'doneById'>

/** Judges an unsigned record. @param kept blocks that stand in the draft already. @throws {AppError} invalid-input with everything impossible in it. */
export async function draftRecord(manager: EntityManager, actor: FarmActor, written: RecordContent, now: Date, kept: readonly string[] = []): Promise<DraftColumns> {
  const ground = await loadRecordGround(manager, actor, written)
  const faults = [...findRecordFaults(written, ground, now), ...findEndedFaults(written, ground, actor.zone, kept)]
  if (faults.length > 0) throw invalid(faults)
  const doer = await findDoer(manager, actor, written)
  // From here on the doer is named: who writes the draft anew later does not become the doer.
  const content = { ...written, doneById: doer.id }
  const { sheet, computed, checks } = judgeRecord(content, ground, actor.zone, now)
  const startedAt = firstStart(content)
  return {
    state: startedAt === null ? 'draft' : 'started',
    content,
    computed,
    checks,
    registerRow: registerRow({ content, sheet, checks, ...ground, doneBy: doer.name, signed: null }),
    sortAt: startedAt === null ? now : new Date(startedAt),
    doneById: doer.id,
  }
}
