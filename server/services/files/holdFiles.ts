import { IsNull, type EntityManager } from 'typeorm'
import type { Attachment as AttachmentAnswer } from '../../../shared/contract/attachment.ts'
import type { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { Attachment } from '../../entities/Attachment.ts'

/** What signed text says of a file. */
type HeldFile = Pick<AttachmentAnswer, 'id' | 'label' | 'type' | 'bytes' | 'digest'>

/**
 * Binds the photos and papers of a record to the version that is being signed: from now on they stand. Call it under the lock
 * of the record. @returns what the signed text says of each, in the order they came.
 */
export async function holdFiles(
  manager: EntityManager,
  { farmId, id: recordId }: Pick<ApplicationRecord, 'farmId' | 'id'>,
  { season, version }: { season: number; version: number },
): Promise<HeldFile[]> {
  await manager.update(Attachment, { farmId, recordId, removedAt: IsNull(), signedVersion: IsNull() }, { season, signedVersion: version })
  return listHeld(manager, { farmId, id: recordId })
}

/** What is with a record, in the order it came. */
async function listHeld(manager: EntityManager, { farmId, id }: Pick<ApplicationRecord, 'farmId' | 'id'>): Promise<HeldFile[]> {
  const rows = await manager.find(Attachment, { where: { farmId, recordId: id, removedAt: IsNull() }, order: { uploadedAt: 'ASC', id: 'ASC' } })
  return rows.map(({ id: fileId, label, type, bytes, digest }) => ({ id: fileId, label, type, bytes, digest }))
}

/** Whether something came since the last signature that no version names. */
export function hasNewFiles(manager: EntityManager, { farmId, id }: Pick<ApplicationRecord, 'farmId' | 'id'>): Promise<boolean> {
  return manager.existsBy(Attachment, { farmId, recordId: id, removedAt: IsNull(), signedVersion: IsNull() })
}

/**
 * What happens to the files of an unsigned record that is discarded, under its lock: with one that was begun they stay, and the
 * journal names them; with a draft they are taken back.
 * @returns those that stay, and the digests whose bytes are wanted no more.
 */
export async function leaveFiles(
  manager: EntityManager, record: Pick<ApplicationRecord, 'farmId' | 'id'>, { keep, at }: { keep: boolean; at: Date },
): Promise<{ kept: HeldFile[]; freed: string[] }> {
  if (keep) return { kept: await listHeld(manager, record), freed: [] }
  const of = { farmId: record.farmId, recordId: record.id, removedAt: IsNull() }
  const rows = await manager.findBy(Attachment, of)
  if (rows.length > 0) await manager.update(Attachment, of, { removedAt: at })
  return { kept: [], freed: rows.flatMap(({ digest, servedDigest }) => (servedDigest === null ? [digest] : [digest, servedDigest])) }
}
