import { IsNull, type EntityManager } from 'typeorm'
import { MOST_FILES, type AddFile, type Attachment as AttachmentAnswer } from '../../../shared/contract/attachment.ts'
import { fileLabel } from '../../../shared/files/fileLabel.ts'
import { digestOfFile } from '../../adapters/files/fileStore.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Attachment } from '../../entities/Attachment.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { encodeImage, type EncodedImage } from './encodeImage.ts'
import { assertRoom, forgetUnheld, keepBytes, lockFiles, orUnavailable } from './farmFiles.ts'
import { findHolder, type FileHolder } from './findHolder.ts'
import { judgeFile, type UploadedFile } from './judgeFile.ts'
import { presentAttachments } from './presentAttachment.ts'

interface Prepared {
  row: Omit<Attachment, 'uploadedAt' | 'season'>
  /** What the store keeps, by digest: the original and, for a picture, what is shown of it. */
  contents: Map<string, Buffer>
}

/**
 * Takes in a photo or paper of a record, signed or not, or the paper of a person, by whoever may write what it belongs to.
 * @returns it, and whether this call made it.
 * @throws {AppError} not-found, forbidden, wrong-type, invalid-input, or unavailable while the store is full or out of reach.
 */
export async function addFile(services: Services, actor: FarmActor, holder: FileHolder, command: AddFile, file: UploadedFile): Promise<{ made: boolean; file: AttachmentAnswer }> {
  await services.database.inFarm(actor, async (manager) => { await findHolder(manager, actor, holder) })
  const prepared = await prepare(actor, holder, command, file)
  const repeated = await services.database.inFarm(actor, async (manager) => {
    const present = await findRepeat(manager, Attachment, prepared.row)
    if (!present) await assertTaken(services, manager, prepared)
    return present && answer(manager, present, false)
  })
  if (repeated) return repeated
  try {
    for (const [digest, bytes] of prepared.contents) await keepBytes(services, { farmId: actor.farmId, digest }, bytes)
    return await services.database.inFarm(actor, (manager) => store(services, manager, actor, prepared))
  } catch (error) {
    await forgetUnheld(services, actor, [...prepared.contents.keys()]).catch((cause: unknown) => services.logger.warn({ err: cause }, 'bytes of a refused file may be left'))
    throw error
  }
}

async function prepare(actor: FarmActor, { about, id: recordId }: FileHolder, { id, kind }: AddFile, file: UploadedFile): Promise<Prepared> {
  const type = await judgeFile(file, kind)
  const digest = digestOfFile(file.bytes)
  const label = fileLabel(file.name, kind)
  const shown = type === 'application/pdf' ? null : await encodeImage(file.bytes, actor.zone)
  return {
    row: {
      farmId: actor.farmId, id, about, recordId, kind, label, type, bytes: file.bytes.length, digest, ...describeShown(shown),
      uploadedById: personOf(actor), signedVersion: null, removedAt: null, creationDigest: digestOf({ id, recordId, kind, label, digest }),
    },
    contents: new Map([[digest, file.bytes], ...(shown ? [[digestOfFile(shown.bytes), shown.bytes] as const] : [])]),
  }
}

function describeShown(shown: EncodedImage | null): Pick<Attachment, 'servedDigest' | 'servedBytes' | 'width' | 'height' | 'takenAt'> {
  if (shown === null) return { servedDigest: null, servedBytes: null, width: null, height: null, takenAt: null }
  const { bytes, width, height, takenAt } = shown
  return { servedDigest: digestOfFile(bytes), servedBytes: bytes.length, width, height, takenAt: takenAt === null ? null : new Date(takenAt) }
}

/** Room on the farm and on the record; asked before the bytes are kept, and again when they count. */
async function assertTaken(services: Services, manager: EntityManager, { row, contents }: Prepared): Promise<void> {
  const { farmId, recordId } = row
  if ((await manager.countBy(Attachment, { farmId, recordId, removedAt: IsNull() })) >= MOST_FILES) throw invalid([{ path: 'file', code: 'file.too_many', params: { maximum: MOST_FILES } }])
  await assertRoom(services, manager, farmId, [...contents.values()].reduce((sum, { length }) => sum + length, 0))
}

async function store(services: Services, manager: EntityManager, actor: FarmActor, prepared: Prepared): Promise<{ made: boolean; file: AttachmentAnswer }> {
  const { row, contents } = prepared
  await lockFiles(manager, actor.farmId)
  const { season } = await findHolder(manager, actor, { about: row.about, id: row.recordId }, true)
  const present = await findRepeat(manager, Attachment, row)
  if (present) return answer(manager, present, false)
  await assertTaken(services, manager, prepared)
  // The same bytes may have been taken back with another file since they were kept.
  for (const [digest, bytes] of contents) {
    const key = { farmId: actor.farmId, digest }
    if (!(await orUnavailable(services, services.files.has(key)))) await keepBytes(services, key, bytes)
  }
  const stored = { ...row, uploadedAt: services.clock.now(), season }
  await manager.insert(Attachment, stored)
  await appendJournal(services, manager, actor, { action: 'file.added', subjectId: row.id, detail: { recordId: row.recordId, digest: row.digest } })
  return answer(manager, stored, true)
}

async function answer(manager: EntityManager, row: Attachment, made: boolean): Promise<{ made: boolean; file: AttachmentAnswer }> {
  const [file] = await presentAttachments(manager, row.farmId, [row])
  if (!file) throw new Error('A file that is there was not presented')
  return { made, file }
}
