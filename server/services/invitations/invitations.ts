import { MoreThan, type EntityManager } from 'typeorm'
import type { Page } from '../../../shared/contract/common.ts'
import type { CreateInvitation, Invitation as InvitationAnswer } from '../../../shared/contract/invitation.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { personOf, type FarmActor } from '../../database/actor.ts'
import { Account } from '../../entities/Account.ts'
import { AccountToken } from '../../entities/AccountToken.ts'
import { Invitation } from '../../entities/Invitation.ts'
import { Person } from '../../entities/Person.ts'
import { AppError, invalid, notFound, stale } from '../../errors.ts'
import { accountOf } from '../accountOf.ts'
import { appendJournal } from '../appendJournal.ts'
import { assertPassword } from '../assertPassword.ts'
import { digestOf, findRepeat, insertOnce } from '../insertOnce.ts'
import { listByKey } from '../listByKey.ts'
import { queueLetter } from '../mail/queueLetter.ts'
import { issueLink } from '../oneTimeLinks.ts'
import type { Services } from '../services.ts'
import { letterMark, presentInvitations } from './presentInvitations.ts'

const DAY_MS = 86_400_000
/** Letters of invitation that one farm may write in a day; more is no farm taking people on. */
const MOST_A_DAY = 40

/**
 * Asks somebody onto the farm by letter. An e-mail that is known here and one that is not are answered alike.
 * @returns the invitation, and whether this call made it.
 * @throws {AppError} `session.wrong_password` where the role leads the farm, `invitation.on_farm` for who works here already,
 *   `invitation.open` where one waits already, `invitation.too_many`.
 */
export async function invite(services: Services, actor: FarmActor, { password, ...input }: CreateInvitation): Promise<{ made: boolean; invitation: InvitationAnswer }> {
  if (input.role !== 'applicator') await assertPassword(services, actor, password ?? '')
  return services.database.inFarm(actor, async (manager) => {
    const key = { farmId: actor.farmId, id: input.id, creationDigest: digestOf(input) }
    const repeat = await findRepeat(manager, Invitation, key)
    if (repeat) return { made: false, invitation: await presentOne(services, manager, repeat) }
    await assertFew(services, manager, actor)
    const account = await accountOf(services, manager, { email: input.email, name: input.name ?? input.email, language: input.language })
    if (await manager.existsBy(Person, { farmId: actor.farmId, accountId: account.id, active: true })) throw invalid([{ path: 'email', code: 'invitation.on_farm' }])
    const { token, expiresAt } = await issueLink(services, manager, { accountId: account.id, kind: 'invitation', detail: { farmId: actor.farmId, invitationId: input.id } })
    const now = services.clock.now()
    const row: Invitation = {
      ...key, ...input, accountId: account.id, invitedById: personOf(actor), createdAt: now, sentAt: now, expiresAt, acceptedAt: null, withdrawnAt: null, revision: 1,
    }
    const { made, stored } = await insertOnce(manager, Invitation, row, { path: 'email', code: 'invitation.open' })
    await appendJournal(services, manager, actor, { action: 'invitation.sent', subjectId: input.id, detail: { role: input.role } })
    await write(services, manager, actor, { invitation: stored, token })
    return { made, invitation: await presentOne(services, manager, stored) }
  })
}

/** The invitations that wait, in the order they were made. */
export function listInvitations(services: Services, actor: FarmActor, page: Page): Promise<{ items: InvitationAnswer[]; next: string | null }> {
  return services.database.inFarm(actor, async (manager) => {
    const { items, next } = await listByKey(manager, Invitation, page, actor.farmId, { key: 'id', where: { acceptedAt: null, withdrawnAt: null }, present: (row) => row })
    return { items: await presentInvitations(services, manager, items), next }
  })
}

/** Writes the letter again, with a new link and another three days; the link before works no more. @throws {AppError} not-found, `stale`, `invitation.too_many`. */
export function resendInvitation(services: Services, actor: FarmActor, id: string, revision: number): Promise<InvitationAnswer> {
  return onOpen(services, actor, { id, revision }, async (manager, invitation) => {
    await assertFew(services, manager, actor)
    await endLinksOf(services, manager, invitation)
    const { token, expiresAt } = await issueLink(services, manager, { accountId: invitation.accountId, kind: 'invitation', detail: { farmId: actor.farmId, invitationId: id } })
    await appendJournal(services, manager, actor, { action: 'invitation.resent', subjectId: id })
    const changes = { sentAt: services.clock.now(), expiresAt }
    await write(services, manager, actor, { invitation: { ...invitation, ...changes, revision: revision + 1 }, token })
    return changes
  })
}

/** Takes an invitation back: its link works no more. @throws {AppError} not-found, `stale`. */
export function withdrawInvitation(services: Services, actor: FarmActor, id: string, revision: number): Promise<InvitationAnswer> {
  return onOpen(services, actor, { id, revision }, async (manager, invitation) => {
    await endLinksOf(services, manager, invitation)
    await appendJournal(services, manager, actor, { action: 'invitation.withdrawn', subjectId: id })
    return { withdrawnAt: services.clock.now() }
  })
}

function onOpen(
  services: Services, actor: FarmActor, { id, revision }: { id: string; revision: number }, deed: (manager: EntityManager, invitation: Invitation) => Promise<Partial<Invitation>>,
): Promise<InvitationAnswer> {
  const key = { farmId: actor.farmId, id }
  return services.database.inFarm(actor, async (manager) => {
    const invitation = await manager.findOne(Invitation, { where: key, lock: { mode: 'pessimistic_write' } })
    if (!invitation) throw notFound()
    const isOpen = invitation.acceptedAt === null && invitation.withdrawnAt === null
    if (!isOpen || invitation.revision !== revision) throw stale(await presentOne(services, manager, invitation))
    const changes = { ...(await deed(manager, invitation)), revision: revision + 1 }
    await manager.update(Invitation, key, changes)
    return presentOne(services, manager, { ...invitation, ...changes })
  })
}

async function endLinksOf({ clock }: Services, manager: EntityManager, { id, accountId }: Invitation): Promise<void> {
  await manager.createQueryBuilder().update(AccountToken).set({ usedAt: clock.now() })
    .where("account_id = :accountId AND kind = 'invitation' AND used_at IS NULL AND detail ->> 'invitationId' = :id", { accountId, id }).execute()
}

async function write(services: Services, manager: EntityManager, actor: FarmActor, { invitation, token }: { invitation: Invitation; token: string }): Promise<void> {
  const inviter = await manager.findOneByOrFail(Account, { id: actor.accountId })
  const by = actor.personName ?? inviter.name
  await queueLetter(services, manager, {
    farmId: actor.farmId, kind: 'invitation', language: invitation.language, to: { email: invitation.email, name: invitation.name },
    ...(inviter.email !== null && { replyTo: { email: inviter.email, name: by } }), once: letterMark(invitation),
    params: { farm: actor.farmName, by, role: invitation.role, token, untilOn: civilDateIn(actor.zone, invitation.expiresAt.toISOString()) },
  })
}

async function assertFew({ clock }: Services, manager: EntityManager, { farmId }: FarmActor): Promise<void> {
  const written = await manager.countBy(Invitation, { farmId, sentAt: MoreThan(new Date(clock.now().getTime() - DAY_MS)) })
  if (written >= MOST_A_DAY) throw new AppError('too-many', 'invitation.too_many')
}

async function presentOne(services: Services, manager: EntityManager, invitation: Invitation): Promise<InvitationAnswer> {
  const [shown] = await presentInvitations(services, manager, [invitation])
  if (!shown) throw notFound()
  return shown
}

