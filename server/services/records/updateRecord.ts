import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { UpdateRecord } from '../../../shared/contract/recordChanges.ts'
import { canonicalText } from '../../../shared/evidence/canonicalText.ts'
import type { FarmActor } from '../../database/actor.ts'
import { together } from '../../database/together.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { AppError, notFound, stale } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { linkJobs } from '../rounds/jobLinks.ts'
import { roundsNow } from '../rounds/listJobs.ts'
import type { Services } from '../services.ts'
import { updateRow } from '../updateRow.ts'
import { assertMayWrite } from './assertMayWrite.ts'
import { draftRecord } from './draftRecord.ts'
import { presentRecord } from './presentRecord.ts'
import { storeProjections } from './storeProjections.ts'

/**
 * Writes an unsigned record anew. Sending again what already stands answers as it did the first time.
 * @throws {AppError} not-found, forbidden, `record.signed`, or `stale` with the record as it is now.
 */
export async function updateRecord(services: Services, actor: FarmActor, id: string, input: UpdateRecord): Promise<RecordAnswer> {
  const now = services.clock.now()
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOne(ApplicationRecord, { where: { farmId: actor.farmId, id }, lock: { mode: 'pessimistic_write' } })
    if (!record) throw notFound()
    assertMayWrite(actor, record)
    // Both clocks are those of the first sending: a later one beside them would look like a clock that is wrong.
    const { revision, deviceAt: _later, jobs, ...sent } = input
    // Nobody named means nobody changed: the doer stays who it was.
    const content = { ...sent, doneById: sent.doneById ?? record.doneById }
    if (record.state === 'signed' || record.state === 'withdrawn') throw new AppError('conflict', 'record.signed', { current: await presentRecord(manager, record) })
    if (record.revision !== revision) {
      const current = await presentRecord(manager, record)
      if (canonicalText(record.content) === canonicalText(content)) return current
      throw stale(current)
    }
    const columns = await draftRecord(manager, actor, content, now, record.content.lines.map(({ blockId }) => blockId))
    const changes = { ...columns, revision: revision + 1 }
    await updateRow(manager, ApplicationRecord, { farmId: actor.farmId, id }, changes)
    const written = { ...record, ...changes }
    if (jobs !== undefined) await linkJobs(manager, roundsNow(services, actor), id, jobs)
    const [answer] = await together([
      presentRecord(manager, written),
      storeProjections(manager, written, true),
      appendJournal(services, manager, actor, { action: 'record.updated', subjectId: id, detail: { revision: written.revision } }),
    ])
    return answer
  })
}
