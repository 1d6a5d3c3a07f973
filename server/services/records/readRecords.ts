import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { FarmActor } from '../../database/actor.ts'
import { ApplicationRecord } from '../../entities/ApplicationRecord.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'
import { presentRecord } from './presentRecord.ts'

/** One record. @throws {AppError} not-found. */
export async function getRecord(services: Services, actor: FarmActor, id: string): Promise<RecordAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const record = await manager.findOneBy(ApplicationRecord, { farmId: actor.farmId, id })
    if (!record) throw notFound()
    return presentRecord(manager, record)
  })
}
