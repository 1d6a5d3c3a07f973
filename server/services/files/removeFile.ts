import type { FarmActor } from '../../database/actor.ts'
import { Attachment } from '../../entities/Attachment.ts'
import { AppError, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { forgetUnheld, orUnavailable } from './farmFiles.ts'
import { findHolder } from './findHolder.ts'

/**
 * Takes a photo or paper back, while no signed version names it; taking it back again changes nothing. Its row stays, its
 * bytes go.
 * @throws {AppError} not-found, forbidden, conflict `file.signed`, unavailable.
 */
export async function removeFile(services: Services, actor: FarmActor, id: string): Promise<void> {
  const { farmId } = actor
  const digests = await services.database.inFarm(actor, async (manager) => {
    const found = await manager.findOneBy(Attachment, { farmId, id })
    if (!found) throw notFound()
    // A signature takes the same lock first, then names the files.
    await findHolder(manager, actor, { about: found.about, id: found.recordId }, true)
    const row = await manager.findOneOrFail(Attachment, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (row.signedVersion !== null) throw new AppError('conflict', 'file.signed')
    if (row.removedAt !== null) return []
    await manager.update(Attachment, { farmId, id }, { removedAt: services.clock.now() })
    await appendJournal(services, manager, actor, { action: 'file.removed', subjectId: id, detail: { recordId: row.recordId, digest: row.digest } })
    return [row.digest, row.servedDigest].filter((digest) => digest !== null)
  })
  await orUnavailable(services, forgetUnheld(services, actor, digests))
}
