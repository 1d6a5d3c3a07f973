import { v7 as uuidV7 } from 'uuid'
import { civilDateIn } from '../../shared/time/civilDate.ts'
import { seasonOf } from '../../shared/time/seasonOf.ts'
import { fixedClock } from '../clock.ts'
import type { FarmActor } from '../database/actor.ts'
import { createFarm } from '../services/farms/createFarm.ts'
import { hashPassword } from '../services/passwords.ts'
import type { Services } from '../services/services.ts'
import { DEMO_ZONE } from './demoZone.ts'
import { makeAccount, makeGrant, makePerson } from './makeAccount.ts'
import { seedBlocks } from './seedBlocks.ts'
import { seedFarm } from './seedFarm.ts'
import { seedGround } from './seedGround.ts'
import { seedNeighbour } from './seedNeighbour.ts'
import { seedGrowing, seedRedrawn } from './seedGrowing.ts'
import { seedInputs } from './seedInputs.ts'
import { seedLetters } from './seedLetters.ts'
import { seedPeople } from './seedPeople.ts'
import { seedRecords } from './seedRecords.ts'
import { seedCalibrations, seedSprayers } from './seedSprayers.ts'
import { seedRounds } from './seedRounds.ts'
import { seedTaken } from './seedTaken.ts'

const DAY_MS = 86_400_000
/** History begins this long before the demo is opened. */
const HISTORY_DAYS = 200

const ACCOUNTS = {
  owner: { email: 'owner@demo.test', name: 'Hesper Quill' },
  manager: { email: 'manager@demo.test', name: 'Oda Verrill' },
  applicator: { email: 'applicator@demo.test', name: 'Tam Lisk' },
  certifier: { email: 'certifier@demo.test', name: 'Mirel Achter' },
  neighbour: { email: 'neighbour@demo.test', name: 'Corin Vane' },
}
/** Who certifies the demo farm, and the last day they may read it. */
const ORGANISATION = 'Oaklode Review'
const grantedTo = (now: Date): string => new Date(now.getTime() + 90 * DAY_MS).toISOString().slice(0, 10)
type AccountName = keyof typeof ACCOUNTS

export interface Demo {
  password: string
  accounts: Record<AccountName, string>
  farmId: string
  neighbourFarmId: string
}

/** Makes the demo farm and its neighbour in an empty database; where they stand already, finds them. */
export async function seedDemo(services: Services, password: string): Promise<Demo> {
  const accounts = Object.fromEntries(Object.entries(ACCOUNTS).map(([name, { email }]) => [name, email])) as Demo['accounts']
  const known = await findDemo(services)
  if (known) return { password, accounts, ...known }
  const beginning = fixedClock(new Date(services.clock.now().getTime() - HISTORY_DAYS * DAY_MS).toISOString())
  const ids = await makeAccounts(services, password, beginning.now())
  const past = { ...services, clock: beginning }
  const { farm } = await createFarm(past, ids.owner, { id: uuidV7(), name: 'Wennick Hollow', zone: DEMO_ZONE, seasonStart: '03-01' })
  const ruanId = await makePeople(services, farm.id, ids, beginning.now())
  const manager = await actorOf(services, ids.manager, farm.id)
  const applicator = await actorOf(services, ids.applicator, farm.id)
  const drawn = await seedBlocks(past, manager)
  const blocks = new Map(drawn.map(({ code, id }) => [code, id]))
  await seedGrowing(services, past, { manager, applicator }, drawn)
  await seedGround(past, manager)
  const sprayers = await seedSprayers(past, manager)
  await seedCalibrations(services, manager, sprayers)
  await seedFarm(services, manager)
  const lots = await seedInputs(services, manager)
  await seedRecords(services, { manager, applicator, ruanId, blocks, sprayers, lots })
  await seedRounds(services, { manager, blocks, lots })
  await seedTaken(services, await actorOf(services, ids.certifier, farm.id))
  await seedLetters(services, await actorOf(services, ids.owner, farm.id), { certifier: ACCOUNTS.certifier, organisation: ORGANISATION, endsOn: grantedTo(services.clock.now()) })
  await seedPeople(services, manager, { applicatorId: applicator.personId ?? '', ruanId })
  await seedRedrawn(services, manager, blocks.get('L1') ?? '')
  const neighbourFarmId = await seedNeighbour(past, ids.neighbour)
  await services.database.inHouse((tx) => tx.query('INSERT INTO demo_seed (demo_farm_id, demo_neighbour_id) VALUES ($1, $2)', [farm.id, neighbourFarmId]))
  return { password, accounts, farmId: farm.id, neighbourFarmId }
}

async function findDemo(services: Services): Promise<{ farmId: string; neighbourFarmId: string } | null> {
  const [found]: { demo_farm_id: string; demo_neighbour_id: string }[] = await services.database.inHouse((tx) => tx.query('SELECT demo_farm_id, demo_neighbour_id FROM demo_seed'))
  return found ? { farmId: found.demo_farm_id, neighbourFarmId: found.demo_neighbour_id } : null
}

async function makeAccounts(services: Services, password: string, createdAt: Date): Promise<Record<AccountName, string>> {
  const passwordHash = await hashPassword(password)
  return services.database.inHouse(async (manager) => {
    const made: Partial<Record<AccountName, string>> = {}
    for (const name of Object.keys(ACCOUNTS) as AccountName[]) {
      made[name] = await makeAccount(manager, { ...ACCOUNTS[name], passwordHash, createdAt })
    }
    return made as Record<AccountName, string>
  })
}

/** Everybody besides the owner; Ruan has no e-mail, the certifier reads the season that is running. */
async function makePeople(services: Services, farmId: string, ids: Record<AccountName, string>, createdAt: Date): Promise<string> {
  const now = services.clock.now()
  const season = seasonOf(civilDateIn(DEMO_ZONE, now.toISOString()), '03-01')
  return services.database.inFarm({ farmId, seasons: null }, async (manager) => {
    await makePerson(manager, { farmId, name: ACCOUNTS.manager.name, role: 'manager', accountId: ids.manager, createdAt })
    await makePerson(manager, { farmId, name: ACCOUNTS.applicator.name, role: 'applicator', accountId: ids.applicator, createdAt })
    await makeGrant(manager, { farmId, accountId: ids.certifier, organisation: ORGANISATION, seasons: [season], endsOn: grantedTo(now), createdAt })
    return makePerson(manager, { farmId, name: 'Ruan Teal', role: 'applicator', accountId: null, createdAt })
  })
}

async function actorOf(services: Services, accountId: string, farmId: string): Promise<FarmActor> {
  const access = await services.database.listAccess(accountId, services.clock.now())
  const actor = access.find((candidate) => candidate.farmId === farmId)
  if (!actor) throw new Error('The demo account has no way into the demo farm')
  return actor
}
