import type { Services } from '../services.ts'
import { SEEN_EVERY_MS, sessionEnd } from './sessionLimits.ts'

/** A session that stands, as the database says at this request. */
export interface OpenSession {
  id: string
  /** Whether its account has a second factor. */
  hasFactor: boolean
}

interface Row {
  id: string
  has_factor: boolean
  opened_at: Date
  seen_at: Date
  ends_at: Date
  is_by_pin: boolean
}

type Parts = Pick<Services, 'database' | 'clock'>

/** The session, where it has not ended and its account is open; asked at each request, so that ending either acts at once. */
export async function readOpenSession({ database, clock }: Parts, { sid, accountId }: { sid: string; accountId: string }): Promise<OpenSession | null> {
  const now = clock.now()
  const [row]: Row[] = await database.askHouse(
    `SELECT s.id, s.opened_at, s.seen_at, s.ends_at, s.shared_phone IS NOT NULL AS is_by_pin, a.totp_secret IS NOT NULL AS has_factor
      FROM sessions s JOIN accounts a ON a.id = s.account_id WHERE s.sid = $1 AND s.account_id = $2 AND a.deactivated_at IS NULL`,
    [sid, accountId],
  )
  if (!row) return null
  const times = { openedAt: row.opened_at, seenAt: row.seen_at, endsAt: row.ends_at, isByPin: row.is_by_pin }
  const isPast = (isShort: boolean): boolean => sessionEnd(times, isShort) <= now
  // What the farms ask is looked up only where the answer would end it.
  if (isPast(false) || (isPast(true) && (row.has_factor || (await isAskedForFactor({ database, clock }, accountId))))) {
    // Gone for good: were the farm to ask no factor tomorrow, it would stand again.
    await database.askHouse('DELETE FROM sessions WHERE sid = $1', [sid])
    return null
  }
  if (now.getTime() - row.seen_at.getTime() > SEEN_EVERY_MS) {
    await database.askHouse('UPDATE sessions SET seen_at = $2 WHERE sid = $1', [sid, now])
  }
  return { id: row.id, hasFactor: row.has_factor }
}

/** Whether a farm asks a second factor of this account, for the role that it has there. */
export async function isAskedForFactor({ database, clock }: Parts, accountId: string): Promise<boolean> {
  return (await database.listAccess(accountId, clock.now())).some(({ asksFactor }) => asksFactor)
}
