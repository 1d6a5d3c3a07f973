import { IsNull, type EntityManager } from 'typeorm'
import type { Attachment as AttachmentAnswer } from '../../../shared/contract/attachment.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Attachment } from '../../entities/Attachment.ts'

/**
 * Binds the photos and papers of a record to the version that is being signed: from now on they stand. Call it under the lock
 * of the record. @returns what the signed text says of each, in the order they came.
 */
export async function holdFiles(
  manager: EntityManager,
  { farmId, id: recordId }: Pick<ApplicationRecord, 'farmId' | 'id'>,
  { season, version }: { season: number; version: number },
): Promise<Pick<AttachmentAnswer, 'id' | 'label' | 'type' | 'bytes' | 'digest'>[]> {
  await manager.update(Attachment, { farmId, recordId, removedAt: IsNull(), signedVersion: IsNull() }, { season, signedVersion: version })
  const rows = await manager.find(Attachment, { where: { farmId, recordId, removedAt: IsNull() }, order: { uploadedAt: 'ASC', id: 'ASC' } })
  return rows.map(({ id, label, type, bytes, digest }) => ({ id, label, type, bytes, digest }))
}
