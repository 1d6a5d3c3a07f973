import { randomBytes } from 'node:crypto'
import { v7 as uuidV7 } from 'uuid'
import { z } from 'zod'
import { IsNull, type EntityManager } from 'typeorm'
import type { Welcome } from '../../../shared/contract/welcome.ts'
import type { Origin } from '../../database/actor.ts'
import type { Account } from '../../entities/Account.ts'
import type { AccountToken } from '../../entities/AccountToken.ts'
import { Farm } from '../../entities/Farm.ts'
import { Invitation } from '../../entities/Invitation.ts'
import { Person } from '../../entities/Person.ts'
import { appendJournal } from '../appendJournal.ts'
import { usedUp } from '../oneTimeLinks.ts'
import type { Services } from '../services.ts'

type Parts = Pick<Services, 'clock' | 'database'>

/** What the link of an invitation keeps beside its digest. */
const detailSchema = z.object({ farmId: z.string(), invitationId: z.string() })

/** What an invitation is to, for whoever holds its link. @throws {AppError} `welcome.used_up` if it was taken back. */
export async function describeInvitation({ database }: Parts, link: AccountToken): Promise<NonNullable<Welcome['invitation']>> {
  const { farmId, invitationId } = detailSchema.parse(link.detail)
  return database.inFarm({ farmId, seasons: null }, async (manager) => {
    const { role, language, name, invitedById } = await findOpen(manager, farmId, invitationId)
    const farm = await manager.findOneByOrFail(Farm, { id: farmId })
    const by = await manager.findOneByOrFail(Person, { farmId, id: invitedById })
    return { farmId, farm: farm.name, by: by.name, role, language, name }
  })
}

/**
 * Makes the invited account a person of the farm, together with whatever else belongs to that moment. Who was on the farm before comes back
 * as who they were, in the role of the invitation.
 * @throws {AppError} `welcome.used_up` if it was taken or taken back meanwhile.
 */
export async function takeInvitation(
  services: Parts, { link, account, origin }: { link: AccountToken; account: Account; origin: Origin }, also: (manager: EntityManager) => Promise<void>,
): Promise<{ farmId: string }> {
  const { farmId, invitationId } = detailSchema.parse(link.detail)
  await services.database.inFarm({ farmId, seasons: null }, async (manager) => {
    const invitation = await findOpen(manager, farmId, invitationId, 'lock')
    await also(manager)
    const personId = await putPerson(services, manager, { farmId, account, role: invitation.role })
    await manager.update(Invitation, { farmId, id: invitationId }, { acceptedAt: services.clock.now(), revision: invitation.revision + 1 })
    await appendJournal(services, manager, { farmId, personId, accountId: account.id, origin }, { action: 'invitation.taken', subjectId: personId, detail: { role: invitation.role } })
  })
  return { farmId }
}

async function findOpen(manager: EntityManager, farmId: string, id: string, lock?: 'lock'): Promise<Invitation> {
  const where = { farmId, id, acceptedAt: IsNull(), withdrawnAt: IsNull() }
  const found = await manager.findOne(Invitation, { where, ...(lock && { lock: { mode: 'pessimistic_write' as const } }) })
  if (!found) throw usedUp()
  return found
}

async function putPerson({ clock }: Parts, manager: EntityManager, { farmId, account, role }: { farmId: string; account: Account; role: Person['role'] }): Promise<string> {
  const known = await manager.findOne(Person, { where: { farmId, accountId: account.id }, lock: { mode: 'pessimistic_write' } })
  if (known) {
    await manager.update(Person, { farmId, id: known.id }, { active: true, role, revision: known.revision + 1 })
    return known.id
  }
  const id = uuidV7()
  await manager.insert(Person, { farmId, id, accountId: account.id, name: account.name, nameSalt: randomBytes(16).toString('hex'), role, active: true, revision: 1, creationDigest: '', createdAt: clock.now() })
  return id
}
