import { randomBytes } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import type { AddPerson, Person as PersonAnswer } from '../../../shared/contract/person.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Person } from '../../entities/Person.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { digestOf, insertOnce } from '../insertOnce.ts'
import type { Services } from '../services.ts'
import { presentPerson } from './presentPeople.ts'
import { assertFitPin, givePin } from './setPin.ts'

/**
 * Takes in somebody without e-mail, with a PIN for the farm's shared phones or without one yet.
 * @returns the person, and whether this call made them.
 * @throws {AppError} `session.wrong_password`, `pin.trivial`, `idempotency.mismatch`.
 */
export async function addPerson(services: Services, actor: FarmActor, { id, name, pin, password }: AddPerson): Promise<{ made: boolean; person: PersonAnswer }> {
  await assertPassword(services, actor, password)
  if (pin !== null) assertFitPin(pin)
  const createdAt = services.clock.now()
  return services.database.inFarm(actor, async (manager) => {
    const row: Person = {
      farmId: actor.farmId, id, name, role: 'applicator', accountId: null, nameSalt: randomBytes(16).toString('hex'), active: true,
      // The PIN is left out: what is hashed without salt could be guessed from it.
      revision: 1, creationDigest: digestOf({ id, name }), createdAt,
    }
    const { made, stored } = await insertOnce(manager, Person, row, { path: 'id', code: 'idempotency.mismatch' })
    if (made) await welcome(services, manager, actor, stored, pin)
    return { made, person: await presentPerson(manager, stored) }
  })
}

async function welcome(services: Services, manager: EntityManager, actor: FarmActor, person: Person, pin: string | null): Promise<void> {
  await appendJournal(services, manager, actor, { action: 'person.added', subjectId: person.id, detail: { role: person.role, withPin: pin !== null } })
  if (pin !== null) person.accountId = await givePin(services, manager, person, pin)
}
