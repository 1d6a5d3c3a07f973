import { In, type EntityManager } from 'typeorm'
import type { Attachment as AttachmentAnswer } from '../../../shared/contract/attachment.ts'
import type { Attachment } from '../../entities/Attachment.ts'
import { Person } from '../../entities/Person.ts'

/** Photos and papers as the contract shows them, with the names of people as they stand now. */
export async function presentAttachments(manager: EntityManager, farmId: string, rows: Attachment[]): Promise<AttachmentAnswer[]> {
  const ids = [...new Set(rows.map(({ uploadedById }) => uploadedById))]
  const people = await manager.find(Person, { select: { id: true, name: true }, where: { farmId, id: In(ids) } })
  return rows.map((row) => present(row, people.find(({ id }) => id === row.uploadedById)?.name ?? ''))
}

function present(row: Attachment, uploader: string): AttachmentAnswer {
  const { servedBytes: bytes, servedDigest: digest, width, height } = row
  return {
    id: row.id,
    recordId: row.recordId,
    kind: row.kind,
    label: row.label,
    type: row.type,
    bytes: row.bytes,
    digest: row.digest,
    served: bytes === null || digest === null || width === null || height === null ? null : { bytes, digest, width, height },
    takenAt: row.takenAt?.toISOString() ?? null,
    uploadedBy: { id: row.uploadedById, name: uploader },
    uploadedAt: row.uploadedAt.toISOString(),
    signedVersion: row.signedVersion,
    removedAt: row.removedAt?.toISOString() ?? null,
  }
}
