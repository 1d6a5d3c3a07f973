import type { EntityManager } from 'typeorm'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { AppError, forbidden, notFound } from '../../errors.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { readSigned } from './readSigned.ts'

export interface SignedRow {
  record: ApplicationRecord
  /** The version that stands, and what it says. */
  newest: RecordVersion
  before: SignedRecord
  firstSignedAt: Date
}

/**
 * A signed record that somebody wants to amend or take back, locked until the transaction ends. Whoever signed a version of it
 * may, and a manager or owner.
 * @throws {AppError} not-found, forbidden, `record.not_signed`.
 */
export async function openSigned(manager: EntityManager, actor: FarmActor, id: string): Promise<SignedRow> {
  const record = await manager.findOne(ApplicationRecord, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
  if (!record) throw notFound()
  if (record.version === 0) {
    assertMayWrite(actor, record)
    throw new AppError('conflict', 'record.not_signed')
  }
  const versions = await manager.find(RecordVersion, { where: { farmId: actor.farmId, recordId: id }, order: { version: 'ASC' } })
  const signers = versions.map(({ signedById }) => signedById)
  if (actor.role === 'applicator' && !signers.includes(personOf(actor))) throw forbidden('record.not_signer')
  const [first, newest] = [versions[0], versions.at(-1)]
  if (!first || !newest) throw new Error(`Record ${id} has no version ${record.version}`)
  return { record, newest, before: readSigned(newest), firstSignedAt: first.signedAt }
}
