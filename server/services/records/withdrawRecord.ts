import type { EntityManager } from 'typeorm'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { WithdrawRecord } from '../../../shared/contract/recordChanges.ts'
import { fillComputed } from '../../../shared/records/fillStored.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { AppError, stale } from '../../errors.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { loadRecordGround } from './loadRecordGround.ts'
import { openSigned } from './openSigned.ts'
import { presentRecord } from './presentRecord.ts'
import { restOn } from './restOn.ts'
import { findTaken, lockLots, returnLots } from './returnLots.ts'
import { writeVersion } from './writeVersion.ts'

/** Takes a signed record back; see `writeWithdrawal`. @throws {AppError} `session.wrong_password` where one was sent. */
export async function withdrawRecord(services: Services, actor: FarmActor, id: string, input: WithdrawRecord): Promise<RecordAnswer> {
  if (input.password !== undefined) await assertPassword(services, actor, input.password)
  return services.database.inFarm(actor, (manager) => writeWithdrawal(services, manager, actor, id, input))
}

/**
 * Takes a signed record back: its lots get what was drawn, and a last version says the same once more, withdrawn, with the reason.
 * The same withdrawal sent again answers with it.
 * @throws {AppError} not-found, forbidden, `record.not_signed`, `record.withdrawn`, `stale`.
 */
export async function writeWithdrawal(
  services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor, id: string, input: WithdrawRecord,
): Promise<RecordAnswer> {
  const { record, newest, before, firstSignedAt } = await openSigned(manager, actor, id)
  if (record.state === 'withdrawn') {
    if (newest.reason === input.reason && newest.signedById === personOf(actor)) return presentRecord(manager, record)
    throw new AppError('conflict', 'record.withdrawn')
  }
  if (input.revision !== undefined && input.revision !== record.revision) throw stale(await presentRecord(manager, record))
  const now = services.clock.now()
  const { content } = before
  const taken = await findTaken(manager, actor.farmId, id)
  const lots = await lockLots(manager, actor.farmId, [...taken.keys()])
  const ground = restOn(await loadRecordGround(manager, actor, content), before)
  await returnLots(manager, lots, taken, { recordId: id, personId: personOf(actor), at: now, reason: input.reason })
  const judged = { sheet: sheetOf(content, ground), computed: fillComputed(record.computed), checks: record.checks }
  return presentRecord(manager, await writeVersion(services, manager, actor, {
    record, entry: 'withdrawn', reason: input.reason, content, ground, judged, acknowledged: record.acknowledged,
    deviceAt: null, firstSignedAt, now,
  }))
}
