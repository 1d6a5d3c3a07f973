import { createHash, randomBytes } from 'node:crypto'
import { In, IsNull, MoreThan, type EntityManager } from 'typeorm'
import { Account } from '../entities/Account.ts'
import { AccountToken } from '../entities/AccountToken.ts'
import { AppError } from '../errors.ts'
import type { Services } from './services.ts'
import { updateRow } from './updateRow.ts'

const BYTES = 32
const MINUTE_MS = 60_000

/** How long a link to a new password works. */
export const RESET_MINUTES = 30
/** How long each kind of link works, minutes. */
const MINUTES: Record<AccountToken['kind'], number> = { welcome: 72 * 60, invitation: 72 * 60, reset: RESET_MINUTES }

type Parts = Pick<Services, 'clock'>

/** Makes a link's secret for an account; only its digest is kept. `minutes`: where it is good for another while than its kind. */
export async function issueLink(
  { clock }: Parts, manager: EntityManager, link: Pick<AccountToken, 'accountId' | 'kind'> & { detail?: object; minutes?: number },
): Promise<{ token: string; expiresAt: Date }> {
  const token = randomBytes(BYTES).toString('base64url')
  const createdAt = clock.now()
  const expiresAt = new Date(createdAt.getTime() + (link.minutes ?? MINUTES[link.kind]) * MINUTE_MS)
  // Of an account that is not there no row is made, by the same statement.
  await manager.query(
    `INSERT INTO account_tokens (token_hash, account_id, kind, detail, created_at, expires_at)
      SELECT $1, a.id, $3, $4, $5, $6 FROM accounts a WHERE a.id = $2`,
    [hashToken(token), link.accountId, link.kind, JSON.stringify(link.detail ?? {}), createdAt, expiresAt],
  )
  return { token, expiresAt }
}

/** The link of a secret and its account. @throws {AppError} `welcome.used_up` where it is spent, late, unknown or of another kind: one text for all. */
export async function findLink({ clock }: Parts, manager: EntityManager, token: string, kinds: AccountToken['kind'][]): Promise<{ link: AccountToken; account: Account }> {
  const link = await manager.findOneBy(AccountToken, { tokenHash: hashToken(token), kind: In(kinds), usedAt: IsNull(), expiresAt: MoreThan(clock.now()) })
  const account = link && (await manager.findOneBy(Account, { id: link.accountId, deactivatedAt: IsNull() }))
  if (!link || !account) throw usedUp()
  return { link, account }
}

/** Spends a link, once. @throws {AppError} `welcome.used_up` if somebody was faster. */
export async function spendLink({ clock }: Parts, manager: EntityManager, { tokenHash }: AccountToken): Promise<void> {
  const spent = await manager.update(AccountToken, { tokenHash, usedAt: IsNull() }, { usedAt: clock.now() })
  if (spent.affected !== 1) throw usedUp()
}

/** Ends other links of an account, which a new password makes needless. */
export async function endLinks({ clock }: Parts, manager: EntityManager, accountId: string, kinds: AccountToken['kind'][]): Promise<void> {
  await updateRow(manager, AccountToken, { accountId, kind: In(kinds), usedAt: IsNull() }, { usedAt: clock.now() })
}

function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}

/** The one refusal of every link that does not work. */
export function usedUp(): AppError {
  return new AppError('bad-request', 'welcome.used_up', { countsAsGuess: true })
}
