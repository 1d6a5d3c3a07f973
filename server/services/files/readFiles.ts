import { IsNull } from 'typeorm'
import type { Attachment as AttachmentAnswer, FileQuery } from '../../../shared/contract/attachment.ts'
import { readWhole } from '../../adapters/files/fileStore.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Attachment } from '../../entities/Attachment.ts'
import { forbidden, notFound } from '../../errors.ts'
import type { Services } from '../services.ts'
import { SERVED_TYPE, shrinkImage } from './encodeImage.ts'
import { orUnavailable } from './farmFiles.ts'
import { assertThere, type FileHolder } from './findHolder.ts'
import { presentAttachments } from './presentAttachment.ts'

/** A file to be sent: what it holds is read when it is asked for, so that nobody is sent what they have. */
export interface FileToSend {
  type: string
  /** The label, with the ending of what is sent. */
  name: string
  /** Changes with what is sent. */
  tag: string
  read(): Promise<Buffer>
}

/** The photos and papers of a record or of another thing, in the order they came. @throws {AppError} not-found. */
export async function listFiles(services: Services, actor: FarmActor, holder: FileHolder): Promise<{ items: AttachmentAnswer[]; next: null }> {
  const { farmId } = actor
  return services.database.inFarm(actor, async (manager) => {
    await assertThere(manager, actor, holder)
    const rows = await manager.find(Attachment, { where: { farmId, about: holder.about, recordId: holder.id, removedAt: IsNull() }, order: { uploadedAt: 'ASC', id: 'ASC' } })
    return { items: await presentAttachments(manager, farmId, rows), next: null }
  })
}

/**
 * One photo or paper to be sent: a picture as it is shown, or the PDF; with `original` as it came in. What a camera wrote into
 * a picture may say where a person was, so its original is for those who lead the farm, and for whoever took it in.
 * @throws {AppError} not-found, forbidden, unavailable.
 */
export async function findFile(services: Services, actor: FarmActor, id: string, { original, size }: FileQuery): Promise<FileToSend> {
  const { farmId } = actor
  const row = await services.database.inFarm(actor, (manager) => manager.findOneBy(Attachment, { farmId, id, removedAt: IsNull() }))
  if (!row) throw notFound()
  const bytesOf = (digest: string): Promise<Buffer> => orUnavailable(services, readWhole(services.files, { farmId, digest }))
  const { servedDigest } = row
  if (servedDigest === null || original !== undefined) {
    if (servedDigest !== null && !mayOpenOriginal(actor, row)) throw forbidden('file.original')
    return { type: row.type, name: row.label, tag: row.digest, read: () => bytesOf(row.digest) }
  }
  const name = `${row.label.replace(/\.[A-Za-z0-9]{1,8}$/, '')}.jpg`
  if (size === undefined) return { type: SERVED_TYPE, name, tag: servedDigest, read: () => bytesOf(servedDigest) }
  return { type: SERVED_TYPE, name, tag: `${servedDigest}-small`, read: async () => shrinkImage(await bytesOf(servedDigest)) }
}

function mayOpenOriginal({ role, personId }: FarmActor, { uploadedById }: Attachment): boolean {
  return role === 'owner' || role === 'manager' || personId === uploadedById
}
