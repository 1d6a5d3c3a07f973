import type { EntityManager } from 'typeorm'
import type { Acknowledged } from '../../../shared/contract/common.ts'
import type { ApplicationRecord as RecordAnswer, Check } from '../../../shared/contract/record.ts'
import type { SignRecord } from '../../../shared/contract/recordChanges.ts'
import { fillContent } from '../../../shared/records/fillStored.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError, invalid, notFound, stale, unlikely, type FieldError } from '../../errors.ts'
import type { Services } from '../services.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { drawLots } from './drawLots.ts'
import { findRecordFaults } from './findRecordFaults.ts'
import { findMissing, findUnlikely } from './findSigningFaults.ts'
import { findClockDoubts, findSuspectDoses } from './findSuspect.ts'
import { judgeRecord } from './judgeRecord.ts'
import { loadRecordGround } from './loadRecordGround.ts'
import { listDraws, planDraws } from './planDraws.ts'
import { presentRecord } from './presentRecord.ts'
import { writeOutAmounts } from './writeOutAmounts.ts'
import { writeVersion } from './writeVersion.ts'

/**
 * Signs a record: judges it as it stands, draws its lots down, gives it its number and its entry in the log.
 * Signing again what is signed answers with it. All of it happens, or nothing.
 * @throws {AppError} not-found, forbidden, `stale` if it is not the revision that the signer saw, invalid-input, or
 *   `unlikely` while a stop, a short lot, a late entry, a dose or a clock that cannot be right has no reason.
 */
export async function sealRecord(
  services: Pick<Services, 'clock'>,
  manager: EntityManager,
  actor: FarmActor,
  id: string,
  input: Pick<SignRecord, 'acknowledged' | 'revision'>,
): Promise<RecordAnswer> {
  const record = await manager.findOne(ApplicationRecord, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!record) throw notFound()
  assertMayWrite(actor, record)
  if (record.state === 'signed') return presentRecord(manager, record)
  if (record.state === 'withdrawn') throw new AppError('conflict', 'record.signed')
  if (input.revision !== undefined && input.revision !== record.revision) throw stale(await presentRecord(manager, record))
  const now = services.clock.now()
  const stored = fillContent(record.content)
  const ground = await loadRecordGround(manager, actor, stored, true)
  const judged = judgeRecord(stored, ground, actor.zone, now)
  const content = writeOutAmounts(stored, judged.sheet)
  const asked = listDraws(content, ground, judged.computed)
  const suspects = [...findSuspectDoses(judged.checks), ...findClockDoubts(record)]
  const acknowledged = keepAsked(input.acknowledged, [...planDraws(asked, []).doubts, ...findUnlikely(content, judged, [], now), ...suspects], judged.checks)
  const draws = planDraws(asked, acknowledged)
  const faults = [...findRecordFaults(content, ground, now), ...findMissing(content, judged.sheet), ...draws.faults]
  if (faults.length > 0) throw invalid(faults)
  const given = new Set(acknowledged.map(({ code }) => code))
  const doubts = [...draws.doubts, ...findUnlikely(content, judged, acknowledged, now), ...suspects.filter(({ code }) => !given.has(code))]
  if (doubts.length > 0) throw unlikely(doubts)
  await drawLots(manager, draws.entries, { recordId: id, personId: personOf(actor), at: now })
  return presentRecord(manager, await writeVersion(services, manager, actor, {
    record, entry: 'signed', reason: null, content, ground, judged, acknowledged, deviceAt: record.deviceAt, now,
  }))
}

/** Reasons that something in the record asks for; others do not belong into what is signed. */
function keepAsked(given: Acknowledged, doubts: FieldError[], checks: Check[]): Acknowledged {
  const stops = checks.filter(({ verdict }) => verdict === 'stop').map(({ code }) => code)
  const codes = new Set([...doubts.map(({ code }) => code), ...stops, ...(stops.length > 0 ? ['record.stop'] : [])])
  return given.filter(({ code }) => codes.has(code))
}
