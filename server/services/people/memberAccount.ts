import type { EntityManager } from 'typeorm'
import type { FarmActor } from '../../database/actor.ts'
import { invalid } from '../../errors.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { dropFactor } from '../factor/ownFactor.ts'
import { tellOfFactor } from '../mail/tellOfFactor.ts'
import type { Services } from '../services.ts'
import { endSessionsOf } from '../sessions/ownSessions.ts'
import { lockPerson } from './lockPeople.ts'

/** Ends all sessions of a member, as after a phone was lost. @throws {AppError} not-found, `session.wrong_password`, `person.no_account`. */
export async function endMemberSessions(services: Services, actor: FarmActor, id: string, password: string): Promise<void> {
  await onAccount(services, actor, { id, password }, async (manager, accountId) => {
    await appendJournal(services, manager, actor, { action: 'person.sessions_ended', subjectId: id })
    await endSessionsOf(manager, accountId)
  })
}

/**
 * Takes a member's second factor away, as after an authenticator was lost; the member sets up a new one. An account that other
 * farms rest on too keeps it: one farm's owner does not weaken it for them.
 * @throws {AppError} not-found, `session.wrong_password`, `person.no_account`, `person.on_other_farms`.
 */
export async function resetMemberFactor(services: Services, actor: FarmActor, id: string, password: string): Promise<void> {
  await onAccount(services, actor, { id, password }, async (manager, accountId) => {
    await assertNobodyElseRests(services, actor, accountId)
    await appendJournal(services, manager, actor, { action: 'person.factor_reset', subjectId: id })
    await dropFactor(manager, accountId, services.clock.now())
    await endSessionsOf(manager, accountId)
    await tellOfFactor(services, manager, { accountId, news: 'reset', farmId: actor.farmId })
  })
}

async function onAccount(
  services: Services, actor: FarmActor, { id, password }: { id: string; password: string }, deed: (manager: EntityManager, accountId: string) => Promise<void>,
): Promise<void> {
  await services.database.inFarm(actor, async (manager) => { await lockPerson(manager, actor, id) })
  await assertPassword(services, actor, password)
  await services.database.inFarm(actor, async (manager) => {
    const { person } = await lockPerson(manager, actor, id)
    if (person.accountId === null) throw invalid([{ path: 'id', code: 'person.no_account' }])
    await deed(manager, person.accountId)
  })
}

async function assertNobodyElseRests({ database, clock }: Services, actor: FarmActor, accountId: string): Promise<void> {
  const own = new Set((await database.listAccess(actor.accountId, clock.now())).flatMap(({ farmId, role }) => (role === 'owner' ? [farmId] : [])))
  const theirs = await database.listAccess(accountId, clock.now())
  if (theirs.some(({ farmId }) => !own.has(farmId))) throw invalid([{ path: 'id', code: 'person.on_other_farms' }])
}
