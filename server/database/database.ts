import type { DataSource, EntityManager } from 'typeorm'
import type { Role } from '../../shared/contract/session.ts'
import type { FarmActor } from './actor.ts'
import { createAppSource } from './dataSource.ts'

interface AccessRow {
  farm_id: string
  farm_name: string
  zone: string
  season_start: string
  role: Role
  person_id: string | null
  person_name: string | null
  seasons: number[] | null
}

/** The only way to the data: by farm (`inFarm`), or to what belongs to no farm (`inHouse`). */
export interface Database {
  /**
   * One transaction on one farm. Its first statement names the farm and, for a certifier, the seasons;
   * row-level security shows nothing else.
   */
  inFarm<T>(actor: Pick<FarmActor, 'farmId' | 'seasons'>, work: (manager: EntityManager) => Promise<T>): Promise<T>
  /** Accounts, one-time links: what belongs to no farm. Farm tables show no row here. */
  inHouse<T>(work: (manager: EntityManager) => Promise<T>): Promise<T>
  /** The farms open to an account at an instant, read anew each time. */
  listAccess(accountId: string, at: Date): Promise<FarmActor[]>
  close(): Promise<void>
}

/** Opens the app role's pool. @param onFault hears of broken idle connections. */
export async function openDatabase(url: string, poolSize: number, onFault: (error: unknown) => void): Promise<Database> {
  const source = createAppSource(url, poolSize, onFault)
  await source.initialize()
  return {
    inFarm: (actor, work) => inFarm(source, actor, work),
    inHouse: (work) => source.transaction(work),
    listAccess: (accountId, at) => listAccess(source, accountId, at),
    close: () => source.destroy(),
  }
}

async function inFarm<T>(
  source: DataSource,
  actor: Pick<FarmActor, 'farmId' | 'seasons'>,
  work: (manager: EntityManager) => Promise<T>,
): Promise<T> {
  return source.transaction(async (manager) => {
    const seasons = actor.seasons === null ? '' : `{${actor.seasons.join(',')}}`
    await manager.query("SELECT set_config('app.farm_id', $1, true), set_config('app.seasons', $2, true)", [actor.farmId, seasons])
    return work(manager)
  })
}

async function listAccess(source: DataSource, accountId: string, at: Date): Promise<FarmActor[]> {
  const rows: AccessRow[] = await source.query('SELECT * FROM account_access($1, $2)', [accountId, at])
  return rows.map((row) => ({
    accountId,
    farmId: row.farm_id,
    farmName: row.farm_name,
    zone: row.zone,
    seasonStart: row.season_start,
    role: row.role,
    personId: row.person_id,
    personName: row.person_name,
    seasons: row.seasons,
  }))
}
