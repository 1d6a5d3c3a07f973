import type { Season } from '../../../shared/contract/seasonReport.ts'
import { seasonOf } from '../../../shared/time/seasonOf.ts'
import type { FarmActor } from '../../database/actor.ts'
import { farmToday } from '../blocks/drawingDay.ts'
import type { Services } from '../services.ts'

/** The seasons with signed records that the reader may see, the newest first, and the running one in any case. */
export async function listSeasons(services: Services, actor: FarmActor): Promise<{ items: Season[] }> {
  const found: Omit<Season, 'isRunning'>[] = await services.database.inFarm(actor, (manager) => manager.query(
    `SELECT work_season AS season, count(*) FILTER (WHERE state = 'signed')::integer AS records, count(*) FILTER (WHERE state = 'withdrawn')::integer AS withdrawn
      FROM register_entries WHERE farm_id = $1 AND state IN ('signed', 'withdrawn') GROUP BY work_season ORDER BY work_season DESC`,
    [actor.farmId],
  ))
  const running = seasonOf(farmToday(services, actor), actor.seasonStart)
  const granted = actor.seasons ?? [running]
  const bare = granted.filter((season) => !found.some((each) => each.season === season)).map((season) => ({ season, records: 0, withdrawn: 0 }))
  return { items: [...found, ...bare].sort((one, other) => other.season - one.season).map((each) => ({ ...each, isRunning: each.season === running })) }
}
