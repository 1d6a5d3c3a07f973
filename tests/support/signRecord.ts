import { buildRecord } from '../../server/demo/buildThings.ts'
import { createRecord } from '../../server/services/records/createRecord.ts'
import { sealRecord } from '../../server/services/records/sealRecord.ts'
import type { ApplicationRecord } from '../../shared/contract/record.ts'
import type { TestFarm, TestHouse } from './openHouse.ts'
import { seedThings } from './seedThings.ts'

/** A record of the farm's own things, signed by its owner. */
export async function signRecord(house: TestHouse, farm: TestFarm, overrides: Partial<Parameters<typeof buildRecord>[0]> = {}): Promise<ApplicationRecord> {
  const actor = await farm.actor('owner')
  const { record } = await createRecord(house.services, actor, buildRecord({ ...(await seedThings(house, farm)), ...overrides }))
  await house.services.database.inFarm(actor, (manager) => sealRecord(house.services, manager, actor, record.id, { acknowledged: [] }))
  return record
}
