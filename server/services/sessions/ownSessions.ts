import type { EntityManager } from 'typeorm'
import type { OwnSession } from '../../../shared/contract/me.ts'
import { deviceWords } from '../../../shared/devices/deviceWords.ts'
import { notFound } from '../../errors.ts'
import type { Services } from '../services.ts'

interface Row {
  id: string
  agent: string | null
  shared_phone: string | null
  opened_at: Date
  seen_at: Date
  ends_at: Date
}

/** An account, and the session by which it asks. */
export interface Who { accountId: string; sessionId: string }

/** The sessions of an account that stand, the one seen last first. */
export async function listOwnSessions({ database, clock }: Services, { accountId, sessionId }: Who): Promise<OwnSession[]> {
  const rows: Row[] = await database.inHouse((manager) => manager.query(
    `SELECT id, agent, shared_phone, opened_at, seen_at, ends_at FROM sessions
      WHERE account_id = $1 AND ends_at > $2 AND expire > now() ORDER BY seen_at DESC, opened_at DESC, id`,
    [accountId, clock.now()],
  ))
  return rows.map((row) => ({
    id: row.id, device: deviceWords(row.agent ?? undefined), onSharedPhone: row.shared_phone !== null, isThis: row.id === sessionId,
    openedAt: row.opened_at.toISOString(), seenAt: row.seen_at.toISOString(), endsAt: row.ends_at.toISOString(),
  }))
}

/** Ends one session of an account. @throws {AppError} not-found for one that is not there or is somebody else's. */
export async function endOwnSession({ database }: Services, accountId: string, id: string): Promise<void> {
  const [, count]: [unknown, number] = await database.inHouse((manager) => manager.query('DELETE FROM sessions WHERE account_id = $1 AND id = $2', [accountId, id]))
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
