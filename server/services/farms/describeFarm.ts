import type { Page } from '../../../shared/contract/common.ts'
import type { Farm as FarmAnswer, Person as PersonAnswer } from '../../../shared/contract/farm.ts'
import { firstCorner } from '../../../shared/geo/boundaryParts.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Block } from '../../entities/Block.ts'
import { Person } from '../../entities/Person.ts'
import { In, IsNull } from 'typeorm'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'

/** The farm as its people see it; its place is a corner of its first block. */
export async function describeFarm(services: Services, actor: FarmActor): Promise<FarmAnswer> {
  const [first] = await services.database.inFarm(actor, (manager) =>
    manager.find(Block, { select: { geometry: true }, where: { farmId: actor.farmId, endedOn: IsNull() }, order: { createdAt: 'ASC', id: 'ASC' }, take: 1 }),
  )
  return {
    id: actor.farmId,
    name: actor.farmName,
    zone: actor.zone,
    seasonStart: actor.seasonStart,
    currentSeason: seasonOf(civilDateIn(actor.zone, services.clock.now().toISOString()), actor.seasonStart),
    place: first ? (firstCorner(first.geometry) ?? null) : null,
  }
}

/** A page of the farm's people by name, with the e-mail of those who have an account. */
export async function listPeople(
  services: Services,
  actor: FarmActor,
  page: Page,
): Promise<{ items: PersonAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const people = await listByKey(manager, Person, page, actor.farmId, { key: 'name', present: (person) => person })
    const ids = people.items.flatMap(({ accountId }) => (accountId === null ? [] : [accountId]))
    const accounts = await manager.find(Account, { select: { id: true, email: true }, where: { id: In(ids) } })
    const emails = new Map(accounts.map(({ id, email }) => [id, email]))
    return {
      items: people.items.map(({ id, name, role, active, accountId }) => ({ id, name, role, active, email: emails.get(accountId ?? '') ?? null })),
      next: people.next,
    }
  })
}
