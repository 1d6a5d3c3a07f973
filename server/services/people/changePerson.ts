import type { EntityManager } from 'typeorm'
import type { ChangePerson, Person as PersonAnswer } from '../../../shared/contract/person.ts'
import type { JournalAction } from '../../../shared/journal/journalActions.ts'
import type { FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { Person } from '../../entities/Person.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import type { Services } from '../services.ts'
import { endSessionsOf } from '../sessions/ownSessions.ts'
import { updateRow } from '../updateRow.ts'
import { assertOwnerStays, lockPerson } from './lockPeople.ts'
import { presentPerson } from './presentPeople.ts'

/**
 * Gives a person another name or role, lets them go, or takes them in again. It acts at their next request.
 * @throws {AppError} not-found, `session.wrong_password`, `stale`, `person.last_owner`, `pin.role` for a role that a PIN does not open.
 */
export async function changePerson(services: Services, actor: FarmActor, id: string, input: ChangePerson): Promise<PersonAnswer> {
  await services.database.inFarm(actor, async (manager) => { await lockPerson(manager, actor, id) })
  await assertPassword(services, actor, input.password)
  const changed = await services.database.inFarm(actor, (manager) => write(services, manager, actor, id, input))
  if (changed.letGo !== null) await endWhereNoFarmIsLeft(services, changed.letGo)
  return changed.person
}

async function write(
  services: Services, manager: EntityManager, actor: FarmActor, id: string, { revision, name, role, active }: ChangePerson,
): Promise<{ person: PersonAnswer; letGo: string | null }> {
  const { person, owners } = await lockPerson(manager, actor, id, revision)
  const next = { name: name ?? person.name, role: role ?? person.role, active: active ?? person.active }
  if (person.role === 'owner' && person.active && (next.role !== 'owner' || !next.active)) await assertOwnerStays(manager, owners, id)
  if (next.role !== 'applicator' && next.role !== person.role) await assertHasPassword(manager, person)
  // The entry is written first: whoever takes their own role away had it when they did.
  for (const entry of entriesOf(person, next)) await appendJournal(services, manager, actor, { ...entry, subjectId: id })
  const changes = { ...next, revision: person.revision + 1 }
  await updateRow(manager, Person, { farmId: actor.farmId, id }, changes)
  if (person.accountId !== null && next.name !== person.name) await manager.update(Account, { id: person.accountId, kind: 'pin' }, { name: next.name })
  const answer = await presentPerson(manager, { ...person, ...changes })
  return { person: answer, letGo: person.active && !next.active ? person.accountId : null }
}

/** What the journal says; names stay out of it, so that they can be blanked. */
function entriesOf(before: Person, next: Pick<Person, 'name' | 'role' | 'active'>): { action: JournalAction; detail?: object }[] {
  const entries: { action: JournalAction; detail?: object }[] = []
  if (next.name !== before.name) entries.push({ action: 'person.renamed' })
  if (next.role !== before.role) entries.push({ action: 'person.role_changed', detail: { from: before.role, to: next.role } })
  if (next.active !== before.active) entries.push({ action: next.active ? 'person.taken_back' : 'person.let_go' })
  return entries
}

/** Who leads a farm signs in with a password of their own. */
async function assertHasPassword(manager: EntityManager, { accountId }: Person): Promise<void> {
  if (accountId !== null && (await manager.existsBy(Account, { id: accountId, kind: 'email' }))) return
  throw invalid([{ path: 'role', code: 'pin.role' }])
}

/** Of an account that no farm is open to any more nothing stays signed in; on other farms the person works on. */
async function endWhereNoFarmIsLeft(services: Services, accountId: string): Promise<void> {
  const left = await services.database.listAccess(accountId, services.clock.now())
  if (left.length === 0) await services.database.inHouse((manager) => endSessionsOf(manager, accountId))
}
