import { randomBytes } from 'node:crypto'
import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import type { z } from 'zod'
import type { createFarmSchema, Farm as FarmAnswer } from '../../../shared/contract/farm.ts'
import { isZone } from '../../../shared/time/isZone.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Farm } from '../../entities/Farm.ts'
import { FarmHead } from '../../entities/FarmHead.ts'
import { Person } from '../../entities/Person.ts'
import { AppError, invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { digestOf } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { describeFarm } from './describeFarm.ts'

/**
 * Makes a farm whose owner is the caller; one for practice is not counted. @returns the farm, and whether this call made it.
 * @throws {AppError} `farm.zone`, `farm.too_many` for an account that owns as many as it may.
 */
export async function createFarm(services: Services, accountId: string, input: z.output<typeof createFarmSchema>, practice = false): Promise<{ made: boolean; farm: FarmAnswer }> {
  if (!isZone(input.zone)) throw invalid([{ path: 'zone', code: 'farm.zone' }])
  const creationDigest = digestOf(input)
  const open = await findOpen(services, accountId, input.id)
  if (open) {
    const stored = await services.database.inFarm(open, (manager) => manager.findOneByOrFail(Farm, { id: input.id }))
    if (stored.creationDigest !== creationDigest) throw invalid([{ path: 'id', code: 'idempotency.mismatch' }])
    return { made: false, farm: await describeFarm(services, open) }
  }
  await insertFarm(services, accountId, { ...input, creationDigest, practice })
  const actor = await findOpen(services, accountId, input.id)
  if (!actor) throw new AppError('conflict', 'conflict')
  return { made: true, farm: await describeFarm(services, actor) }
}

async function findOpen(services: Services, accountId: string, farmId: string): Promise<FarmActor | undefined> {
  const access = await services.database.listAccess(accountId, services.clock.now())
  return access.find((candidate) => candidate.farmId === farmId)
}

async function insertFarm(services: Services, accountId: string, input: z.output<typeof createFarmSchema> & Pick<Farm, 'creationDigest' | 'practice'>): Promise<void> {
  const createdAt = services.clock.now()
  await services.database.inFarm({ farmId: input.id, seasons: null }, async (manager) => {
    // Locked, so that farms made at the same moment are counted one after the other.
    const account = await manager.findOneOrFail(Account, { where: { id: accountId }, lock: { mode: 'pessimistic_write' } })
    if (!input.practice) await assertRoomForOne(services, manager, account)
    const taken = await manager.createQueryBuilder().insert().into(Farm)
      .values({ ...input, revision: 1, createdAt }).orIgnore().returning('id').execute()
    // An id of somebody else's farm is answered like one's own repeated with other content: nothing is learned.
    if ((taken.raw as unknown[]).length === 0) throw invalid([{ path: 'id', code: 'idempotency.mismatch' }])
    await manager.insert(FarmHead, { farmId: input.id, lastSeq: 0 })
    const personId = uuidV7()
    await manager.insert(Person, {
      farmId: input.id, id: personId, accountId, name: account.name, nameSalt: randomBytes(16).toString('hex'),
      role: 'owner', active: true, createdAt,
    })
    await appendJournal(services, manager, { farmId: input.id, personId, accountId }, { action: 'farm.created', subjectId: input.id, detail: { name: input.name } })
  })
}

async function assertRoomForOne({ config, clock }: Services, manager: EntityManager, { id, practiceFarmId }: Account): Promise<void> {
  const [{ owned }]: [{ owned: number }] = await manager.query(
    "SELECT count(*)::integer AS owned FROM account_access($1, $2) WHERE role = 'owner' AND farm_id IS DISTINCT FROM $3",
    [id, clock.now(), practiceFarmId],
  )
  if (owned >= config.farmsPerAccount) throw invalid([{ path: 'id', code: 'farm.too_many', params: { maximum: config.farmsPerAccount } }])
}
