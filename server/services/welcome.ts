import { createHash, randomBytes } from 'node:crypto'
import { IsNull, MoreThan, type EntityManager } from 'typeorm'
import { v7 as uuidV7 } from 'uuid'
import { Account } from '../entities/Account.ts'
import { AccountToken } from '../entities/AccountToken.ts'
import { AppError } from '../errors.ts'
import { assertGoodPassword } from './passwordRules.ts'
import { hashPassword } from './passwords.ts'
import type { Services } from './services.ts'

const HOURS_VALID = 72

type Parts = Pick<Services, 'clock' | 'database'>

/** Makes the secret of an account's one-time link, in the caller's transaction. Only a digest is kept. @param hours how long it is good. */
export async function issueWelcome({ clock }: Pick<Services, 'clock'>, manager: EntityManager, accountId: string, hours = HOURS_VALID): Promise<{ token: string; expiresAt: Date }> {
  const token = randomBytes(32).toString('base64url')
  const createdAt = clock.now()
  const expiresAt = new Date(createdAt.getTime() + hours * 3_600_000)
  await manager.insert(AccountToken, { tokenHash: hashToken(token), accountId, kind: 'welcome', createdAt, expiresAt, usedAt: null })
  return { token, expiresAt }
}

/** Makes a one-time link's secret for an e-mail, and its account if there is none. */
export async function inviteOwner(services: Parts, email: string): Promise<{ token: string; expiresAt: Date }> {
  const createdAt = services.clock.now()
  return services.database.inHouse(async (manager) => {
    const known = await manager.findOneBy(Account, { email: email.toLowerCase() })
    const accountId = known?.id ?? uuidV7()
    if (!known) {
      await manager.insert(Account, { id: accountId, email: email.toLowerCase(), name: email, passwordHash: null, language: 'en', createdAt, deactivatedAt: null })
    }
    return issueWelcome(services, manager, accountId)
  })
}

/** Whom a link is for. @throws {AppError} `welcome.used_up` for a link that is spent, late or unknown: one text for all. */
export async function readWelcome(services: Parts, token: string): Promise<{ email: string }> {
  return services.database.inHouse(async (manager) => {
    const found = await findToken(services, manager, token)
    return { email: (await manager.findOneByOrFail(Account, { id: found.accountId })).email ?? '' }
  })
}

/** Spends a link: the account takes its name and password; its other links and its sessions end. @returns the account's id. */
export async function acceptWelcome(services: Parts, input: { token: string; name: string; password: string }): Promise<string> {
  const { accountId } = await services.database.inHouse((manager) => findToken(services, manager, input.token))
  assertGoodPassword(input.password)
  const passwordHash = await hashPassword(input.password)
  return services.database.inHouse(async (manager) => {
    const { tokenHash } = await findToken(services, manager, input.token)
    const usedAt = services.clock.now()
    const spent = await manager.update(AccountToken, { tokenHash, usedAt: IsNull() }, { usedAt })
    if (spent.affected !== 1) throw usedUp()
    await manager.update(AccountToken, { accountId, usedAt: IsNull() }, { usedAt })
    await manager.update(Account, { id: accountId }, { name: input.name, passwordHash })
    await manager.query("DELETE FROM sessions WHERE sess #>> '{passport,user}' = $1", [accountId])
    return accountId
  })
}

async function findToken(services: Parts, manager: EntityManager, token: string): Promise<AccountToken> {
  const found = await manager.findOneBy(AccountToken, { tokenHash: hashToken(token), usedAt: IsNull(), expiresAt: MoreThan(services.clock.now()) })
  if (!found) throw usedUp()
  const isOpen = await manager.existsBy(Account, { id: found.accountId, deactivatedAt: IsNull() })
  if (!isOpen) throw usedUp()
  return found
}

function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}

function usedUp(): AppError {
  return new AppError('bad-request', 'welcome.used_up', { countsAsGuess: true })
}
