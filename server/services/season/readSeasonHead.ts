import type { EntityManager } from 'typeorm'
import { seasonDigest, type LogEntry } from '../../../shared/evidence/seasonDigest.ts'
import type { FarmActor } from '../../database/actor.ts'

const NO_END = 2_147_483_647

/**
 * The last entry of a season's log and the digest of all up to it, or up to `upTo`; null while the season has none. Worked out
 * from the signed texts themselves, so that a changed text shows even where the digest kept beside it was changed too.
 */
export async function readSeasonHead(
  manager: EntityManager, { farmId }: Pick<FarmActor, 'farmId'>, season: number, upTo = NO_END,
): Promise<LogEntry | null> {
  const entries: LogEntry[] = await manager.query(
    `SELECT seq, encode(sha256(convert_to(canonical_text, 'UTF8')), 'hex') AS digest FROM record_versions
      WHERE farm_id = $1 AND season = $2 AND seq <= $3 ORDER BY seq`,
    [farmId, season, upTo],
  )
  const last = entries.at(-1)
  return last === undefined ? null : { seq: last.seq, digest: seasonDigest(farmId, season, entries) }
}
