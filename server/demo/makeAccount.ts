import { randomBytes } from 'node:crypto'
import { v7 as uuidV7 } from 'uuid'
import type { EntityManager } from 'typeorm'
import { Account } from '../entities/Account.ts'
import { Grant } from '../entities/Grant.ts'
import { Person } from '../entities/Person.ts'

/** Inserts an account. @returns its id. */
export async function makeAccount(
  manager: EntityManager,
  { email, name, passwordHash, createdAt, language = 'en' }: Pick<Account, 'email' | 'name' | 'passwordHash' | 'createdAt'> & { language?: Account['language'] },
): Promise<string> {
  const id = uuidV7()
  await manager.insert(Account, { id, email, name, passwordHash, language, createdAt, deactivatedAt: null })
  return id
}

/** Inserts a person of a farm, with an account or without. @returns the person's id. */
export async function makePerson(
  manager: EntityManager,
  { farmId, name, role, accountId, createdAt }: Pick<Person, 'farmId' | 'name' | 'role' | 'accountId' | 'createdAt'>,
): Promise<string> {
  const id = uuidV7()
  await manager.insert(Person, { farmId, id, name, role, accountId, nameSalt: randomBytes(16).toString('hex'), active: true, createdAt })
  return id
}

/** Lets a certifier read seasons of a farm until a civil day. @returns the grant's id. */
export async function makeGrant(
  manager: EntityManager,
  { farmId, accountId, seasons, endsOn, createdAt, organisation = '' }: Pick<Grant, 'farmId' | 'accountId' | 'seasons' | 'endsOn' | 'createdAt'> & Partial<Pick<Grant, 'organisation'>>,
): Promise<string> {
  const id = uuidV7()
  await manager.insert(Grant, { farmId, id, accountId, organisation, seasons, endsOn, createdAt })
  return id
}
