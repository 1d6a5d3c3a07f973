import { LessThanOrEqual, type EntityManager } from 'typeorm'
import { AccountToken } from '../entities/AccountToken.ts'
import { Letter } from '../entities/Letter.ts'
import { ResetAsk } from '../entities/ResetAsk.ts'
import type { Services } from './services.ts'
import { pruneSessions } from './sessions/pruneSessions.ts'

const DAY_MS = 86_400_000

/** How long what is over is kept, days. Secrets of a letter are gone sooner: once it is out, or given up. */
export const KEPT_DAYS = {
  /** A letter that is out or given up, from when it was written. */
  letters: 90,
  /** A one-time link that is spent or late; of it there was only a digest. */
  links: 30,
  /** How often a new password was asked for; it counts for an hour. */
  resetAsks: 1,
} as const

/**
 * Takes away what is over and told of long enough: letters of all farms and of the house, one-time links, counts of asked resets, and
 * sessions that have ended. Safe to run twice, and in two processes. @returns how many of each.
 */
export async function pruneOld(services: Pick<Services, 'clock' | 'database'>): Promise<Record<'letters' | 'links' | 'resetAsks' | 'sessions', number>> {
  const { database } = services
  const now = services.clock.now()
  const before = (days: number): Date => new Date(now.getTime() - days * DAY_MS)
  const letters = await database.inPost(async (manager) =>
    (await manager.createQueryBuilder().delete().from(Letter)
      .where("state IN ('sent', 'dead') AND created_at <= :before", { before: before(KEPT_DAYS.letters) }).execute()).affected ?? 0)
  return database.inHouse(async (manager) => ({
    letters,
    links: await pruneLinks(manager, before(KEPT_DAYS.links)),
    resetAsks: (await manager.delete(ResetAsk, { since: LessThanOrEqual(before(KEPT_DAYS.resetAsks)) })).affected ?? 0,
    sessions: await pruneSessions(manager, now),
  }))
}

async function pruneLinks(manager: EntityManager, before: Date): Promise<number> {
  const gone = await manager.createQueryBuilder().delete().from(AccountToken).where('expires_at <= :before OR used_at <= :before', { before }).execute()
  return gone.affected ?? 0
}
