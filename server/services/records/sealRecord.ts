import type { EntityManager } from 'typeorm'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { SignRecord } from '../../../shared/contract/recordChanges.ts'
import { fillContent } from '../../../shared/records/fillStored.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { holdNumbersAfter } from '../rounds/holdNumbers.ts'
import { roundsNow } from '../rounds/listJobs.ts'
import type { Services } from '../services.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { drawLots } from './drawLots.ts'
import { loadRecordGround } from './loadRecordGround.ts'
import { presentRecord } from './presentRecord.ts'
import { weighRecord } from './weighRecord.ts'
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
  const { content, judged, acknowledged, draws } = weighRecord({
    written: stored, ground, zone: actor.zone, now, firstSignedAt: now, sent: record, reasons: () => input.acknowledged,
  })
  await drawLots(manager, draws, { recordId: id, personId: personOf(actor), at: now })
  const signed = await writeVersion(services, manager, actor, {
    record, entry: 'signed', reason: null, content, ground, judged, acknowledged, deviceAt: record.deviceAt, firstSignedAt: now, now,
  })
  await holdNumbersAfter(manager, roundsNow(services, actor), content)
  return presentRecord(manager, signed)
}
