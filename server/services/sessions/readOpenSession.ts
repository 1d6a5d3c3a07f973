import type { Services } from '../services.ts'

/** A session that stands, as the database says at this request. */
export interface OpenSession {
  id: string
  /** Whether its account has a second factor. */
  hasFactor: boolean
}

interface Row {
  id: string
  has_factor: boolean
  seen_at: Date
}

/** How exact the time is at which a session was seen last. */
const SEEN_EVERY_MS = 5 * 60_000

/** The session, where it has not ended and its account is open; asked at each request, so that ending either acts at once. */
export async function readOpenSession(
  { database, clock }: Pick<Services, 'database' | 'clock'>, { sid, accountId }: { sid: string; accountId: string },
): Promise<OpenSession | null> {
  const now = clock.now()
  return database.inHouse(async (manager) => {
    const [row]: Row[] = await manager.query(
      `SELECT s.id, s.seen_at, a.totp_secret IS NOT NULL AS has_factor FROM sessions s JOIN accounts a ON a.id = s.account_id
        WHERE s.sid = $1 AND s.account_id = $2 AND s.ends_at > $3 AND a.deactivated_at IS NULL`,
      [sid, accountId, now],
    )
    if (!row) return null
    if (now.getTime() - row.seen_at.getTime() > SEEN_EVERY_MS) await manager.query('UPDATE sessions SET seen_at = $2 WHERE sid = $1', [sid, now])
    return { id: row.id, hasFactor: row.has_factor }
  })
}
