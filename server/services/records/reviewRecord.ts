import { v7 as uuidV7 } from 'uuid'
import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { ReviewRecord } from '../../../shared/contract/recordChanges.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { RecordReview } from '../../entities/RecordReview.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import type { Services } from '../services.ts'
import { TERM } from '../register/recordTerms.ts'
import { presentRecord } from './presentRecord.ts'

/**
 * Says that somebody has read the version that stands. It changes nothing, and the same person says it once of a version.
 * @throws {AppError} not-found, `record.not_signed`, `stale` if another version stands than the one that was read.
 */
export async function reviewRecord(services: Services, actor: FarmActor, id: string, { version, note }: ReviewRecord): Promise<RecordAnswer> {
  const { farmId } = actor
  return services.database.inFarm(actor, async (manager) => {
    // Locked, so that two presses at once are one review.
    const record = await manager.findOne(ApplicationRecord, { where: { farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!record) throw notFound()
    if (record.season === null) throw new AppError('conflict', 'record.not_signed')
    if (version !== undefined && version !== record.version) throw stale(await presentRecord(manager, record))
    const review = { farmId, recordId: id, version: record.version, reviewedById: personOf(actor) }
    if (await manager.existsBy(RecordReview, review)) return presentRecord(manager, record)
    await manager.insert(RecordReview, { ...review, id: uuidV7(), season: record.season, at: services.clock.now(), note })
    await manager.query(
      `WITH waiting AS (DELETE FROM record_terms WHERE farm_id = $1 AND record_id = $2 AND term = $3 RETURNING *)
       INSERT INTO record_terms (farm_id, record_id, term, season, work_season, sort_at)
       SELECT farm_id, record_id, $4, season, work_season, sort_at FROM waiting`,
      [farmId, id, TERM.review('waiting'), TERM.review('done')],
    )
    await appendJournal(services, manager, actor, { action: 'record.reviewed', subjectId: id, detail: { version: record.version } })
    return presentRecord(manager, record)
  })
}
