import type { EntityManager } from 'typeorm'
import type { GrantedSeason, GrantedSeasons } from '../../../shared/contract/grant.ts'
import { cutCheckCode } from '../../../shared/evidence/checkCode.ts'
import type { FarmActor } from '../../database/actor.ts'
import { SeasonHead } from '../../entities/SeasonHead.ts'
import { readSeasonHead } from '../season/readSeasonHead.ts'
import type { Services } from '../services.ts'
import { listEndedGrants } from './listEndedGrants.ts'

interface Granted { farm_id: string; season: number; ends_on: string }

/** Every season of every farm that is granted to an account now, one by one: farms by name, the newest season first; and what has ended. */
export async function listGrantedSeasons(services: Services, accountId: string): Promise<GrantedSeasons> {
  const at = services.clock.now()
  const farms = (await services.database.listAccess(accountId, at)).filter(({ role }) => role === 'certifier')
  const granted: Granted[] = await services.database.askHouse('SELECT * FROM account_grants($1, $2)', [accountId, at])
  const items: GrantedSeason[] = []
  for (const farm of farms) {
    const seasons = granted.filter(({ farm_id: id }) => id === farm.farmId).sort((one, other) => other.season - one.season)
    const rows = await services.database.inFarm(farm, async (manager) => {
      const read: GrantedSeason[] = []
      for (const { season, ends_on: grantedTo } of seasons) read.push(await describeSeason(manager, farm, { season, grantedTo }))
      return read
    })
    items.push(...rows)
  }
  return { items, ended: await listEndedGrants(services, accountId) }
}

async function describeSeason(manager: EntityManager, farm: FarmActor, { season, grantedTo }: { season: number; grantedTo: string }): Promise<GrantedSeason> {
  const { farmId, farmName, zone, accountId } = farm
  const [counts]: { records: number; withdrawn: number }[] = await manager.query(
    `SELECT count(*) FILTER (WHERE state = 'signed')::integer AS records, count(*) FILTER (WHERE state = 'withdrawn')::integer AS withdrawn
      FROM register_entries WHERE farm_id = $1 AND work_season = $2`,
    [farmId, season],
  )
  const taken = await manager.findOne(SeasonHead, { where: { farmId, accountId, season }, order: { takenAt: 'DESC', id: 'DESC' } })
  const now = taken && (await readSeasonHead(manager, farm, season, taken.seq))
  return {
    farmId, farmName, zone, season, grantedTo,
    records: counts?.records ?? 0, withdrawn: counts?.withdrawn ?? 0,
    head: taken && { seq: taken.seq, checkCode: cutCheckCode(taken.digest), takenAt: taken.takenAt.toISOString(), agrees: now?.digest === taken.digest },
  }
}
