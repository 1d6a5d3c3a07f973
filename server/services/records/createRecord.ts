import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { CreateRecord } from '../../../shared/contract/recordChanges.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { together } from '../../database/together.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import { linkJobs } from '../rounds/jobLinks.ts'
import { roundsNow } from '../rounds/listJobs.ts'
import type { Services } from '../services.ts'
import { draftRecord } from './draftRecord.ts'
import { presentRecord } from './presentRecord.ts'
import { storeProjections } from './storeProjections.ts'

/** Takes in a draft or a started record. @returns the record, and whether this call made it. */
export async function createRecord(services: Services, actor: FarmActor, input: CreateRecord): Promise<{ made: boolean; record: RecordAnswer }> {
  const now = services.clock.now()
  return services.database.inFarm(actor, async (manager) => {
    const { id, deviceAt, jobs, ...content } = input
    const creationDigest = digestOf({ ...content, id, ...(jobs.length > 0 && { jobs }) })
    const repeated = await findRepeat(manager, ApplicationRecord, { farmId: actor.farmId, id, creationDigest })
    if (repeated) return { made: false, record: await presentRecord(manager, repeated) }
    const row: ApplicationRecord = {
      ...(await draftRecord(manager, actor, content, now)),
      farmId: actor.farmId,
      id,
      acknowledged: [],
      season: null,
      number: null,
      seq: null,
      digest: null,
      version: 0,
      revision: 1,
      enteredById: personOf(actor),
      signedById: null,
      deviceAt: deviceAt === null ? null : new Date(deviceAt),
      receivedAt: now,
      signedAt: null,
      creationDigest,
    }
    const { made, stored } = await insertOnce(manager, ApplicationRecord, row, { path: 'id', code: 'idempotency.mismatch' })
    if (!made) return { made, record: await presentRecord(manager, stored) }
    if (jobs.length > 0) await linkJobs(manager, roundsNow(services, actor), id, jobs)
    const [record] = await together([
      presentRecord(manager, row),
      storeProjections(manager, row, false),
      appendJournal(services, manager, actor, { action: `record.${row.state}`, subjectId: id }),
    ])
    return { made, record }
  })
}
