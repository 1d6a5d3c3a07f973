import { In, type EntityManager } from 'typeorm'
import type { Page } from '../../../shared/contract/common.ts'
import type { Person as PersonAnswer } from '../../../shared/contract/person.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Person } from '../../entities/Person.ts'
import { notFound } from '../../errors.ts'
import { listByKey } from '../listByKey.ts'
import type { Services } from '../services.ts'

/** A page of the farm's people by name, with the e-mail of those who have one. */
export async function listPeople(services: Services, actor: FarmActor, page: Page): Promise<{ items: PersonAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const people = await listByKey(manager, Person, page, actor.farmId, { key: 'name', present: (person) => person })
    return { items: await presentPeople(manager, people.items), next: people.next }
  })
}

/** One person of the farm. @throws {AppError} not-found. */
export async function getPerson(services: Services, actor: FarmActor, id: string): Promise<PersonAnswer> {
  return services.database.inFarm(actor, async (manager) => {
    const person = await manager.findOneBy(Person, { farmId: actor.farmId, id })
    if (!person) throw notFound()
    return presentPerson(manager, person)
  })
}

export async function presentPerson(manager: EntityManager, person: Person): Promise<PersonAnswer> {
  const [shown] = await presentPeople(manager, [person])
  if (!shown) throw new Error('A person who is there was not presented')
  return shown
}

async function presentPeople(manager: EntityManager, people: Person[]): Promise<PersonAnswer[]> {
  const ids = people.flatMap(({ accountId }) => (accountId === null ? [] : [accountId]))
  const accounts = await manager.find(Account, { select: { id: true, email: true, kind: true, totpSecret: true }, where: { id: In(ids) } })
  return people.map(({ id, name, role, active, accountId, revision }) => {
    const account = accounts.find((candidate) => candidate.id === accountId)
    return {
      id, name, role, active, revision, email: account?.email ?? null, hasFactor: (account?.totpSecret ?? null) !== null,
      signsWith: account === undefined ? null : account.kind === 'pin' ? 'pin' : 'password',
    }
  })
}
