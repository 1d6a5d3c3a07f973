import { IsNull, Not, type EntityManager } from 'typeorm'
import type { Language } from '../../shared/messages/translate.ts'
import { Account } from '../entities/Account.ts'
import { AppError } from '../errors.ts'
import { emailDigest } from './emailDigest.ts'
import { queueLetter } from './mail/queueLetter.ts'
import { tellOfPassword } from './mail/tellOfPassword.ts'
import { HOUSE } from './mail/house.ts'
import { endLinks, findLink, issueLink, RESET_MINUTES, spendLink } from './oneTimeLinks.ts'
import { assertGoodPassword, farmNames } from './passwordRules.ts'
import { hashPassword } from './passwords.ts'
import type { Services } from './services.ts'
import { endSessionsOf } from './sessions/ownSessions.ts'

const HOUR_MS = 3_600_000
/** Under one e-mail, and from one address of the net. */
const MOST_AN_HOUR = { email: 5, address: 20 }

type Parts = Pick<Services, 'clock' | 'config' | 'database'>

/**
 * Writes a letter with a link to a new password, to the e-mail of an open account that has one. For any other e-mail the same statements
 * run and the letter is taken back, so that neither answer nor time tells which there are.
 * @throws {AppError} too-many after five an hour under one e-mail, known or not, or twenty from one address.
 */
export async function askForReset(services: Parts, { email, language, address }: { email: string; language: Language; address: string }): Promise<void> {
  await services.database.inHouse(async (manager) => {
    await countAsk(services, manager, 'address', address)
    await countAsk(services, manager, 'email', email)
    const account = await manager.findOneBy(Account, { email, deactivatedAt: IsNull(), passwordHash: Not(IsNull()) })
    await manager.query('SAVEPOINT letter')
    const { token } = await issueLink(services, manager, { accountId: account?.id ?? HOUSE, kind: 'reset' })
    await queueLetter(services, manager, {
      farmId: null, kind: 'passwordReset', language: account?.language ?? language, to: { email: account?.email ?? email, name: account?.name ?? null },
      params: { email: account?.email ?? email, token, minutes: RESET_MINUTES },
    })
    await manager.query(account ? 'RELEASE SAVEPOINT letter' : 'ROLLBACK TO SAVEPOINT letter')
  })
}

/** Whose password a link renews. @throws {AppError} `welcome.used_up`. */
export async function readReset(services: Parts, token: string): Promise<{ email: string }> {
  const { account } = await services.database.inHouse((manager) => findLink(services, manager, token, ['reset']))
  return { email: account.email ?? '' }
}

/**
 * Spends a link: a new password, the account's sessions end, and its e-mail is told. Nobody is signed in by it, and a second factor stays.
 * @returns the account's id. @throws {AppError} `welcome.used_up`, or a weak password.
 */
export async function resetPassword(services: Parts, { token, password }: { token: string; password: string }): Promise<string> {
  const { account, link } = await services.database.inHouse((manager) => findLink(services, manager, token, ['reset']))
  assertGoodPassword(password, { own: [account.email, account.name, ...(await farmNames(services, account.id))] })
  const passwordHash = await hashPassword(password)
  await services.database.inHouse(async (manager) => {
    await spendLink(services, manager, link)
    await endLinks(services, manager, account.id, ['reset', 'welcome'])
    await manager.update(Account, { id: account.id }, { passwordHash })
    await endSessionsOf(manager, account.id)
    await tellOfPassword(services, manager, account)
  })
  return account.id
}

async function countAsk({ clock, config }: Parts, manager: EntityManager, kind: keyof typeof MOST_AN_HOUR, asker: string): Promise<void> {
  const now = clock.now()
  const [{ asked }]: [{ asked: number }] = await manager.query(
    `INSERT INTO reset_asks (email_digest, asked, since) VALUES ($1, 1, $2)
      ON CONFLICT (email_digest) DO UPDATE SET asked = CASE WHEN reset_asks.since <= $3 THEN 1 ELSE reset_asks.asked + 1 END,
        since = CASE WHEN reset_asks.since <= $3 THEN $2 ELSE reset_asks.since END
      RETURNING asked`,
    [emailDigest(config.sessionSecret, kind === 'email' ? asker : `${kind} ${asker}`), now, new Date(now.getTime() - HOUR_MS)],
  )
  if (asked > MOST_AN_HOUR[kind]) throw new AppError('too-many', 'reset.too_many')
}
