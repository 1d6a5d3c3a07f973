import { v7 as uuidV7 } from 'uuid'
import type { Farm as FarmAnswer } from '../../shared/contract/farm.ts'
import { translate } from '../../shared/messages/translate.ts'
import type { FarmActor } from '../database/actor.ts'
import { Account } from '../entities/Account.ts'
import { Person } from '../entities/Person.ts'
import { AppError, notFound } from '../errors.ts'
import { appendJournal } from '../services/appendJournal.ts'
import { createFarm } from '../services/farms/createFarm.ts'
import { describeFarm } from '../services/farms/describeFarm.ts'
import { createRecord } from '../services/records/createRecord.ts'
import { sealRecord } from '../services/records/sealRecord.ts'
import { updateStart } from '../services/farms/startSteps.ts'
import type { Services } from '../services/services.ts'
import { buildRecord } from './buildThings.ts'
import { DEMO_ZONE } from './demoZone.ts'
import { seedBlocks } from './seedBlocks.ts'
import { seedInputs } from './seedInputs.ts'
import { seedCalibrations, seedSprayers } from './seedSprayers.ts'

const HOUR_MS = 3_600_000
const CODES = ['A1', 'A2', 'A3', 'P1', 'T1', 'T2']

/**
 * A farm to try things on, one an account, apart from its own farms: some blocks, inputs, sprayers and signed work, marked as practice.
 * @returns it, and whether this call made it. @throws {AppError} `practice.making` while it is being made.
 */
export async function makePracticeFarm(services: Services, accountId: string, id: string): Promise<{ made: boolean; farm: FarmAnswer }> {
  const account = await readAccount(services, accountId)
  const open = account.practiceFarmId === null ? undefined : await actorOn(services, accountId, account.practiceFarmId)
  if (open) return { made: false, farm: await describeFarm(services, open) }
  if (!(await holdPlace(services, account, id))) throw new AppError('conflict', 'practice.making')
  const name = translate(account.language, 'start.practice.farmName')
  await createFarm(services, accountId, { id, name, zone: DEMO_ZONE, seasonStart: '03-01' }, true)
  const actor = await actorOn(services, accountId, id)
  if (!actor) throw new AppError('conflict', 'practice.making')
  await fill(services, actor)
  return { made: true, farm: await describeFarm(services, actor) }
}

/** Puts the practice farm away: nobody opens it any more, and another can be made. @throws {AppError} not-found where there is none. */
export async function putPracticeAway(services: Services, accountId: string): Promise<void> {
  const { practiceFarmId } = await readAccount(services, accountId)
  const actor = practiceFarmId === null ? undefined : await actorOn(services, accountId, practiceFarmId)
  if (!actor) throw notFound()
  await services.database.inFarm(actor, async (manager) => {
    // Written first: whoever has no role any more writes no entry.
    await appendJournal(services, manager, actor, { action: 'practice.put_away', subjectId: actor.farmId })
    await manager.update(Person, { farmId: actor.farmId }, { active: false })
  })
  await services.database.inHouse((manager) => manager.update(Account, { id: accountId }, { practiceFarmId: null }))
}

function readAccount(services: Services, accountId: string): Promise<Account> {
  return services.database.inHouse((manager) => manager.findOneByOrFail(Account, { id: accountId }))
}

async function actorOn(services: Services, accountId: string, farmId: string): Promise<FarmActor | undefined> {
  return (await services.database.listAccess(accountId, services.clock.now())).find((actor) => actor.farmId === farmId)
}

/** One request makes it: the account is given the id if it still stands as it was read. */
async function holdPlace({ database }: Services, { id, practiceFarmId }: Account, farmId: string): Promise<boolean> {
  if (practiceFarmId === farmId) return false
  const held: [unknown[], number] = await database.askHouse(
    'UPDATE accounts SET practice_farm_id = $2 WHERE id = $1 AND practice_farm_id IS NOT DISTINCT FROM $3', [id, farmId, practiceFarmId],
  )
  return held[1] === 1
}

async function fill(services: Services, actor: FarmActor): Promise<void> {
  const blocks = await seedBlocks(services, actor, CODES)
  const sprayers = await seedSprayers(services, actor)
  await seedCalibrations(services, actor, sprayers)
  const lots = await seedInputs(services, actor)
  const nettle = lots.get('nettle')
  if (!nettle) throw new Error('The demo inputs have no nettle')
  for (const [place, { id, code }] of blocks.entries()) {
    const endedAt = new Date(services.clock.now().getTime() - (place + 1) * 4 * HOUR_MS)
    const isDrench = code.startsWith('T')
    const { record } = await createRecord(services, actor, buildRecord({
      id: uuidV7(), blockId: id, materialId: nettle.materialId, lotId: nettle.lots[0]?.id ?? null, method: isDrench ? 'drench' : 'foliar',
      startedAt: new Date(endedAt.getTime() - HOUR_MS).toISOString(), endedAt: endedAt.toISOString(), sprayerId: sprayers.get(isDrench ? 'D1' : 'M2') ?? null,
      water: isDrench ? { sizedFrom: 'water', value: '200', unit: 'L', source: null } : { sizedFrom: 'sprayRate', value: '410', unit: 'L/ha', source: null },
    }))
    // The last one is left as a draft, to be signed by whoever tries.
    if (place < blocks.length - 1) await services.database.inFarm(actor, (manager) => sealRecord(services, manager, actor, record.id, { acknowledged: [] }))
  }
  await updateStart(services, actor, { away: true })
}
