import type { ApplicationRecord as RecordAnswer } from '../../../shared/contract/record.ts'
import type { SignRecord } from '../../../shared/contract/recordChanges.ts'
import type { FarmActor } from '../../database/actor.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { sealRecord } from './sealRecord.ts'

/** Signs a record with the signer's password; see `sealRecord`. @throws {AppError} `session.wrong_password`. */
export async function signRecord(services: Services, actor: FarmActor, id: string, input: SignRecord): Promise<RecordAnswer> {
  await assertPassword(services, actor, input.password)
  return services.database.inFarm(actor, (manager) => sealRecord(services, manager, actor, id, input))
}
