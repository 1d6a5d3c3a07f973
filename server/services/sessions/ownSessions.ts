import type { EntityManager } from 'typeorm'
import type { OwnSession } from '../../../shared/contract/me.ts'
import { deviceWords } from '../../../shared/devices/deviceWords.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'
import { isAskedForFactor } from './readOpenSession.ts'
import { sessionEnd } from './sessionLimits.ts'

interface Row {
  id: string
  agent: string | null
  shared_phone: string | null
  opened_at: Date
  seen_at: Date
  ends_at: Date
  has_factor: boolean
}

/** An account, and the session by which it asks. */
export interface Who { accountId: string; sessionId: string }

/** The sessions of an account that stand, the one seen last first. */
export async function listOwnSessions(services: Services, { accountId, sessionId }: Who): Promise<OwnSession[]> {
  const now = services.clock.now()
  const rows: Row[] = await services.database.askHouse(
    `SELECT s.id, s.agent, s.shared_phone, s.opened_at, s.seen_at, s.ends_at, a.totp_secret IS NOT NULL AS has_factor
      FROM sessions s JOIN accounts a ON a.id = s.account_id
      WHERE s.account_id = $1 AND s.expire > now() ORDER BY s.seen_at DESC, s.opened_at DESC, s.id`,
    [accountId],
  )
  const isShort = rows.some((row) => row.has_factor) || (await isAskedForFactor(services, accountId))
  return rows.map((row) => {
    const onSharedPhone = row.shared_phone !== null
    const endsAt = sessionEnd({ openedAt: row.opened_at, seenAt: row.seen_at, endsAt: row.ends_at, isByPin: onSharedPhone }, isShort)
    return {
      id: row.id, device: deviceWords(row.agent ?? undefined), onSharedPhone, isThis: row.id === sessionId,
      openedAt: row.opened_at.toISOString(), seenAt: row.seen_at.toISOString(), endsAt: endsAt.toISOString(),
    }
  }).filter(({ endsAt }) => endsAt > now.toISOString())
}

/** Ends one session of an account. @throws {AppError} not-found for one that is not there or is somebody else's. */
export async function endOwnSession({ database }: Services, accountId: string, id: string): Promise<void> {
  const [, count]: [unknown, number] = await database.askHouse('DELETE FROM sessions WHERE account_id = $1 AND id = $2', [accountId, id])
  if (count === 0) throw notFound()
}

/** Ends all sessions of an account but the one that asks. */
export async function endOtherSessions({ database }: Services, { accountId, sessionId }: Who): Promise<void> {
  await database.inHouse((manager) => endSessionsOf(manager, accountId, sessionId))
}

/** Ends all sessions of an account. @param exceptId one that stays. */
export async function endSessionsOf(manager: EntityManager, accountId: string, exceptId?: string): Promise<void> {
  await manager.query('DELETE FROM sessions WHERE account_id = $1 AND id IS DISTINCT FROM $2', [accountId, exceptId ?? null])
}
