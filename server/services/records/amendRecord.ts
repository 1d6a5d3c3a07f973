import type { EntityManager } from 'typeorm'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { AmendRecord } from '../../../shared/contract/recordChanges.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import { sheetOf } from '../../../shared/records/sheetOf.ts'
import { addDecimals } from '../../../shared/units/addDecimals.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { AppError, stale } from '../../errors.ts'
import { assertPassword } from '../assertPassword.ts'
import { hasNewFiles } from '../files/holdFiles.ts'
import type { Services } from '../services.ts'
import { carryReasons, takes } from './carryReasons.ts'
import { drawLots } from './drawLots.ts'
import { loadRecordGround } from './loadRecordGround.ts'
import { mergeAmendment } from './mergeAmendment.ts'
import { openSigned, type SignedRow } from './openSigned.ts'
import { presentRecord } from './presentRecord.ts'
import { restOn } from './restOn.ts'
import { findTaken, lockLots, returnLots } from './returnLots.ts'
import { weighRecord } from './weighRecord.ts'
import { writeOutAmounts } from './writeOutAmounts.ts'
import { writeVersion } from './writeVersion.ts'

/** Amends a signed record; see `writeAmendment`. @throws {AppError} `session.wrong_password` where one was sent. */
export async function amendRecord(services: Services, actor: FarmActor, id: string, input: AmendRecord): Promise<RecordAnswer> {
  if (input.password !== undefined) await assertPassword(services, actor, input.password)
  return services.database.inFarm(actor, (manager) => writeAmendment(services, manager, actor, id, input))
}

/**
 * Writes a new version of a signed record: judged anew over what the version before rested on, its old draw given back and the
 * new one taken. Number and season stay. Sent again over the revision it was made on, it answers with what it made.
 * @throws {AppError} not-found, forbidden, `record.not_signed`, `record.withdrawn`, `stale`, `record.nothing_changed`,
 *   invalid-input, or `unlikely` while something new in it has no reason.
 */
export async function writeAmendment(
  services: Pick<Services, 'clock'>, manager: EntityManager, actor: FarmActor, id: string, input: AmendRecord,
): Promise<RecordAnswer> {
  const { record, newest, before, firstSignedAt } = await openSigned(manager, actor, id)
  if (record.state === 'withdrawn') throw new AppError('conflict', 'record.withdrawn')
  const written = await mergeAmendment(manager, actor, before, input)
  if (input.revision !== undefined && input.revision !== record.revision) {
    const repeated = writeOutAmounts(written, sheetOf(written, before))
    if (isRepeat({ record, newest }, actor, input) && !differs(repeated, before.content)) return presentRecord(manager, record)
    throw stale(await presentRecord(manager, record))
  }
  const now = services.clock.now()
  const deviceAt = input.deviceAt === null ? null : new Date(input.deviceAt)
  const taken = await findTaken(manager, actor.farmId, id)
  const lots = await lockLots(manager, actor.farmId, [...taken.keys(), ...written.components.flatMap(({ lotId }) => lotId ?? [])])
  const stood = restOn(await loadRecordGround(manager, actor, written, true), before)
  const ground = { ...stood, lots: stood.lots.map((lot) => ({ ...lot, leftQuantity: addDecimals(lot.leftQuantity, taken.get(lot.id) ?? '0') })) }
  const { content, judged, acknowledged, draws } = weighRecord({
    written, ground, zone: actor.zone, now, firstSignedAt, sent: { deviceAt, receivedAt: now },
    reasons: (judgement, said) => carryReasons(input.acknowledged, before, { content: said, judged: judgement }),
  })
  if (!differs(content, before.content) && !(await hasNewFiles(manager, record))) throw new AppError('invalid-input', 'record.nothing_changed')
  if (takes(content, judged.computed) !== takes(before.content, before.computed)) {
    const by = { recordId: id, personId: personOf(actor), at: now }
    await returnLots(manager, lots, taken, { ...by, reason: input.reason })
    await drawLots(manager, draws, by)
  }
  return presentRecord(manager, await writeVersion(services, manager, actor, {
    record, entry: 'amended', reason: input.reason, content, ground, judged, acknowledged,
    deviceAt, firstSignedAt, now,
  }))
}

/** The answer to an amendment was lost on its way and it comes once more. */
function isRepeat({ record, newest }: Pick<SignedRow, 'record' | 'newest'>, actor: FarmActor, { revision, reason }: AmendRecord): boolean {
  return revision === record.revision - 1 && newest.entry === 'amended' && newest.reason === reason && newest.signedById === personOf(actor)
}

function differs(one: object, other: object): boolean {
  return canonicalText(one) !== canonicalText(other)
}
