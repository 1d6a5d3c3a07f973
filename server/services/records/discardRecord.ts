import type { DiscardRecord } from '../../../shared/contract/recordChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { JournalEntry } from '../../entities/JournalEntry.ts'
import { AppError, notFound } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { forgetUnheld, orUnavailable } from '../files/farmFiles.ts'
import { leaveFiles } from '../files/holdFiles.ts'
import { unlinkJobs } from '../rounds/jobLinks.ts'
import type { Services } from '../services.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { dropProjections } from './storeProjections.ts'

const ACTION = 'record.discarded'

/**
 * Takes an unsigned record away. One that had a start stays whole in the journal: what was begun is not forgotten. Discarding again
 * what is gone changes nothing.
 * @throws {AppError} not-found, forbidden, `record.signed`.
 */
export async function discardRecord(services: Services, actor: FarmActor, id: string, { reason }: DiscardRecord): Promise<void> {
  const { farmId } = actor
  const freed = await services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOne(ApplicationRecord, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!record) {
      if (await manager.existsBy(JournalEntry, { farmId, subjectId: id, action: ACTION })) return []
      throw notFound()
    }
    assertMayWrite(actor, record)
    if (record.version > 0) throw new AppError('conflict', 'record.signed')
    const isBegun = record.state === 'started'
    const files = await leaveFiles(manager, record, { keep: isBegun, at: services.clock.now() })
    await dropProjections(manager, { farmId, recordId: id })
    await unlinkJobs(manager, { farmId, recordId: id })
    await manager.delete(ApplicationRecord, { farmId, id })
    const { state, content, doneById, enteredById, receivedAt } = record
    const whole = isBegun ? { content, doneById, enteredById, receivedAt: receivedAt.toISOString(), files: files.kept } : {}
    await appendJournal(services, manager, actor, { action: ACTION, subjectId: id, detail: { state, reason, ...whole } })
    return files.freed
  })
  if (freed.length > 0) await orUnavailable(services, forgetUnheld(services, actor, freed))
}
