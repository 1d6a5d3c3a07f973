import { In, type EntityManager } from 'typeorm'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Person } from '../../entities/Person.ts'
import { invalid, notFound, stale } from '../../errors.ts'
import { presentPerson } from './presentPeople.ts'

/**
 * Locks a person and every owner of the farm, in the order of their ids, so that two owners who act on each other wait and do not
 * block each other. Keys stay open: a deed that only names one of them, and then asks whether its doer still has the role, holds a
 * key of one and waits for the other.
 * @throws {AppError} not-found, `stale` over another revision than the one that was seen.
 */
export async function lockPerson(manager: EntityManager, { farmId }: FarmActor, id: string, revision?: number): Promise<{ person: Person; owners: Person[] }> {
  const locked = await manager.find(Person, {
    where: [{ farmId, id }, { farmId, role: 'owner' }], order: { id: 'ASC' }, lock: { mode: 'for_no_key_update' },
  })
  const person = locked.find((candidate) => candidate.id === id)
  if (!person) throw notFound()
  if (revision !== undefined && person.revision !== revision) throw stale(await presentPerson(manager, person))
  return { person, owners: locked.filter(({ role }) => role === 'owner') }
}

/**
 * Holds that somebody can still open the farm as its owner when this person no longer does.
 * @throws {AppError} `person.last_owner`.
 */
export async function assertOwnerStays(manager: EntityManager, owners: Person[], leavingId: string): Promise<void> {
  const others = owners.filter(({ id, active, accountId }) => id !== leavingId && active && accountId !== null)
  const accounts = await manager.findBy(Account, { id: In(others.flatMap(({ accountId }) => accountId ?? [])) })
  if (accounts.some(({ deactivatedAt }) => deactivatedAt === null)) return
  throw invalid([{ path: 'role', code: 'person.last_owner' }])
}
