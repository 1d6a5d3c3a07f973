import type { EntityManager } from 'typeorm'
import { v7 as uuidV7 } from 'uuid'
import type { Person as PersonAnswer, SetPin } from '../../../shared/contract/person.ts'
import { isTrivialPin } from '../../../shared/people/isTrivialPin.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Person } from '../../entities/Person.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { hashPassword } from '../passwords.ts'
import type { Services } from '../services.ts'
import { endSessionsOf } from '../sessions/ownSessions.ts'
import { updateRow } from '../updateRow.ts'
import { lockPerson } from './lockPeople.ts'
import { presentPerson } from './presentPeople.ts'

/**
 * Gives somebody without e-mail a PIN, or another one; sessions under the old one end.
 * @throws {AppError} not-found, `session.wrong_password`, `pin.trivial`, `stale`, `pin.has_email`, `pin.role` for an owner or manager.
 */
export async function setPin(services: Services, actor: FarmActor, id: string, { pin, revision, password }: SetPin): Promise<PersonAnswer> {
  await services.database.inFarm(actor, async (manager) => { await lockPerson(manager, actor, id) })
  await assertPassword(services, actor, password)
  assertFitPin(pin)
  return services.database.inFarm(actor, async (manager) => {
    const { person } = await lockPerson(manager, actor, id, revision)
    if (person.role !== 'applicator') throw invalid([{ path: 'pin', code: 'pin.role' }])
    const accountId = await givePin(services, manager, person, pin)
    const changed = { accountId, revision: person.revision + 1 }
    await updateRow(manager, Person, { farmId: actor.farmId, id }, changed)
    await appendJournal(services, manager, actor, { action: 'person.pin_set', subjectId: id })
    return presentPerson(manager, { ...person, ...changed })
  })
}

/** Keeps the PIN with the person's account, which is made where there is none. @returns its id. @throws {AppError} `pin.has_email`. */
export async function givePin(services: Pick<Services, 'clock'>, manager: EntityManager, person: Person, pin: string): Promise<string> {
  const passwordHash = await hashPassword(pin)
  if (person.accountId === null) {
    const accountId = uuidV7()
    await manager.insert(Account, { id: accountId, email: null, kind: 'pin', name: person.name, passwordHash, createdAt: services.clock.now(), deactivatedAt: null })
    await updateRow(manager, Person, { farmId: person.farmId, id: person.id }, { accountId })
    return accountId
  }
  const changed = await manager.update(Account, { id: person.accountId, kind: 'pin' }, { passwordHash })
  if (changed.affected !== 1) throw invalid([{ path: 'pin', code: 'pin.has_email' }])
  await endSessionsOf(manager, person.accountId)
  return person.accountId
}

/** @throws {AppError} `pin.trivial` for one that anybody tries first. */
export function assertFitPin(pin: string, path = 'pin'): void {
  if (isTrivialPin(pin)) throw invalid([{ path, code: 'pin.trivial' }])
}
