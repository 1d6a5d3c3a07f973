import type { Services } from '../services.ts'
import { longestSpan } from './sessionLimits.ts'

/** What a browser says of itself is cut here. */
const MOST_AGENT = 300

/** Where a session was opened by PIN; null where by password. */
export type SessionKind = { farmId: string; phoneId: string } | null

/** The name under which a session keeps the shared phone that it was opened on. */
export function phoneKey({ farmId, phoneId }: NonNullable<SessionKind>): string {
  return `${farmId}/${phoneId}`
}

/** Writes down whose a new session is, where it was opened and when it ends. An account that has as many as it may loses those not seen for longest. */
export async function recordSession(
  { config, clock, database }: Pick<Services, 'config' | 'clock' | 'database'>,
  { sid, accountId, agent, kind }: { sid: string; accountId: string; agent: string | null; kind: SessionKind },
): Promise<void> {
  const now = clock.now()
  const endsAt = new Date(now.getTime() + longestSpan(kind !== null))
  await database.inHouse(async (manager) => {
    await manager.query(
      'UPDATE sessions SET account_id = $2, agent = $3, opened_at = $4, seen_at = $4, ends_at = $5, shared_phone = $6 WHERE sid = $1',
      [sid, accountId, agent?.slice(0, MOST_AGENT) ?? null, now, endsAt, kind && phoneKey(kind)],
    )
    await manager.query(
      `DELETE FROM sessions WHERE sid IN
        (SELECT sid FROM sessions WHERE account_id = $1 AND sid <> $2 ORDER BY seen_at DESC, opened_at DESC, id DESC OFFSET $3)`,
      [accountId, sid, config.sessionsPerAccount - 1],
    )
  })
}
