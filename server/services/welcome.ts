import type { EntityManager } from 'typeorm'
import type { Welcome } from '../../shared/contract/welcome.ts'
import type { Origin } from '../database/actor.ts'
import { Account } from '../entities/Account.ts'
import { AppError } from '../errors.ts'
import { accountOf } from './accountOf.ts'
import { describeGrant } from './grants/describeGrant.ts'
import { describeInvitation, takeInvitation } from './invitations/takeInvitation.ts'
import { endLinks, findLink, issueLink, spendLink } from './oneTimeLinks.ts'
import { assertGoodPassword } from './passwordRules.ts'
import { hashPassword } from './passwords.ts'
import { tellOfPassword } from './mail/tellOfPassword.ts'
import type { Services } from './services.ts'
import { endSessionsOf } from './sessions/ownSessions.ts'

type Parts = Pick<Services, 'clock' | 'config' | 'database'>

/** Makes a one-time link's secret for an e-mail, and its account if there is none. */
export async function inviteOwner(services: Pick<Services, 'clock' | 'database'>, email: string): Promise<{ token: string; expiresAt: Date }> {
  return services.database.inHouse(async (manager) => {
    const { id: accountId } = await accountOf(services, manager, { email: email.toLowerCase(), name: email, language: 'en' })
    return issueLink(services, manager, { accountId, kind: 'welcome' })
  })
}

/** Whom a link is for, onto which farm, and what it lets them read. @throws {AppError} `welcome.used_up`. */
export async function readWelcome(services: Parts, token: string): Promise<Welcome> {
  const { link, account } = await services.database.inHouse((manager) => findLink(services, manager, token, ['welcome', 'invitation']))
  const invitation = link.kind === 'invitation' ? await describeInvitation(services, link) : null
  const grant = await describeGrant(services, link)
  return { email: account.email ?? '', needsPassword: link.kind === 'welcome' || account.passwordHash === null, invitation, grant }
}

/**
 * Spends a link: the account takes its name and password, and the farm's invitation with them; its other links to a password and its
 * sessions end. @returns the account's id, and the e-mail by which it signs in.
 * @throws {AppError} `welcome.used_up`, `welcome.has_account` for an invitation of somebody who signs in already, or a weak password.
 */
export async function acceptWelcome(services: Parts, input: { token: string; name: string; password: string }, origin: Origin): Promise<{ accountId: string; email: string }> {
  const { link, account } = await services.database.inHouse((manager) => findLink(services, manager, input.token, ['welcome', 'invitation']))
  if (link.kind === 'invitation' && account.passwordHash !== null) throw new AppError('conflict', 'welcome.has_account')
  const farm = link.kind === 'invitation' ? (await describeInvitation(services, link)).farm : null
  assertGoodPassword(input.password, { own: [account.email, input.name, farm] })
  const passwordHash = await hashPassword(input.password)
  const work = async (manager: EntityManager): Promise<void> => {
    await spendLink(services, manager, link)
    await endLinks(services, manager, account.id, ['welcome', 'reset'])
    await manager.update(Account, { id: account.id }, { name: input.name, passwordHash })
    await endSessionsOf(manager, account.id)
  }
  if (link.kind === 'invitation') await takeInvitation(services, { link, account: { ...account, name: input.name }, origin }, work)
  else {
    await services.database.inHouse(async (manager) => {
      await work(manager)
      if (account.passwordHash !== null) await tellOfPassword(services, manager, account)
    })
  }
  return { accountId: account.id, email: account.email ?? '' }
}

/**
 * Takes an invitation with the account that is signed in. @returns the farm's id.
 * @throws {AppError} `welcome.used_up`, `welcome.other_account` where it is for another e-mail.
 */
export async function acceptSignedIn(services: Parts, accountId: string, token: string, origin: Origin): Promise<{ farmId: string }> {
  const { link, account } = await services.database.inHouse((manager) => findLink(services, manager, token, ['invitation']))
  if (account.id !== accountId) throw new AppError('conflict', 'welcome.other_account')
  return takeInvitation(services, { link, account, origin }, (manager) => spendLink(services, manager, link))
}
