import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordVersion } from '../../entities/RecordVersion.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'
import { presentRecord } from './presentRecord.ts'
import { readSigned } from './readSigned.ts'

/** One record. @throws {AppError} not-found. */
export async function getRecord(services: Services, actor: FarmActor, id: string): Promise<RecordAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    return presentRecord(manager, record)
  })
}

/** Every signed version of a record, oldest first, with the text that its digest is over. @throws {AppError} not-found. */
export async function listRecordVersions(
  services: Services,
  actor: FarmActor,
  id: string,
): Promise<{ items: { version: number; digest: string; canonicalText: string; signed: SignedRecord }[]; next: null }> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    const versions = await manager.find(RecordVersion, { where: { farmId: actor.farmId, recordId: id }, order: { version: 'ASC' } })
    return {
      items: versions.map((row) => ({ version: row.version, digest: row.digest, canonicalText: row.canonicalText, signed: readSigned(row) })),
      next: null,
    }
  })
}
