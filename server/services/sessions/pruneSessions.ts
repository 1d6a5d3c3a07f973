import type { EntityManager } from 'typeorm'
import { limitsOf } from './sessionLimits.ts'

/** Takes away sessions that have ended: those that a visit would find ended, whether or not it comes. @returns how many. */
export async function pruneSessions(manager: EntityManager, now: Date): Promise<number> {
  const [byPassword, byFactor] = [limitsOf({ isByPin: false, isShort: false }), limitsOf({ isByPin: false, isShort: true })]
  const before = (ms: number): Date => new Date(now.getTime() - ms)
  const [, count]: [unknown, number] = await manager.query(
    `DELETE FROM sessions s USING accounts a WHERE a.id = s.account_id AND (
      s.ends_at <= $1 OR s.seen_at <= $2 OR (a.totp_secret IS NOT NULL AND s.shared_phone IS NULL AND (s.seen_at <= $3 OR s.opened_at <= $4)))`,
    [now, before(byPassword.idle), before(byFactor.idle), before(byFactor.span)],
  )
  return count
}
