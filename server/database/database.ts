import { QueryFailedError, type DataSource, type EntityManager } from 'typeorm'
import type { Role } from '../../shared/contract/session.ts'
import { forbidden, notFound } from '../errors.ts'
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
  kind: 'email' | 'pin'
  asks_factor: boolean
}

/** Who acts, where; seeding and the making of a farm know no role. */
type Scope = Pick<FarmActor, 'farmId' | 'seasons'> & Partial<Pick<FarmActor, 'role'>>

/** A farm as timed work meets it, which has no actor. */
export interface FarmOnRound {
  farmId: string
  farmName: string
  zone: string
  /** MM-DD. */
  seasonStart: string
  seasons: null
}

/** The only way to the data: by farm (`inFarm`), to what belongs to no farm (`inHouse`), or to every farm's letters (`inPost`). */
export interface Database {
  /**
   * One transaction on one farm. Its first statement names the farm and, for a certifier, the seasons;
   * row-level security shows nothing else. The journal asks once more, in the same transaction, whether the doer still has the role.
   * @throws {AppError} not-found or forbidden if the role has ended or changed since the actor was read.
   */
  inFarm<T>(actor: Scope, work: (manager: EntityManager) => Promise<T>): Promise<T>
  /** Accounts, one-time links: what belongs to no farm. Farm tables show no row here. */
  inHouse<T>(work: (manager: EntityManager) => Promise<T>): Promise<T>
  /** One statement on what belongs to no farm, without the two journeys that a transaction of its own would cost. */
  askHouse<T>(statement: string, values: readonly unknown[]): Promise<T>
  /** The letters of every farm and of the house, for whoever carries them out; farm tables show no row here. */
  inPost<T>(work: (manager: EntityManager) => Promise<T>): Promise<T>
  /** Every farm, for timed work: each is then entered by `inFarm`. */
  listFarms(): Promise<FarmOnRound[]>
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
    askHouse: (statement, values) => source.query(statement, [...values]),
    inPost: (work) => source.transaction(async (manager) => {
      await manager.query("SELECT set_config('app.post', 'on', true)")
      return work(manager)
    }),
    listFarms: () => listFarms(source),
    listAccess: (accountId, at) => listAccess(source, accountId, at),
    close: () => source.destroy(),
  }
}

async function inFarm<T>(
  source: DataSource,
  { farmId, seasons, role }: Scope,
  work: (manager: EntityManager) => Promise<T>,
): Promise<T> {
  try {
    return await source.transaction(async (manager) => {
      const granted = seasons === null ? '' : `{${seasons.join(',')}}`
      await manager.query(
        "SELECT set_config('app.farm_id', $1, true), set_config('app.seasons', $2, true), set_config('app.role', $3, true)",
        [farmId, granted, role ?? ''],
      )
      return work(manager)
    })
  } catch (error) {
    throw refusalOf(error) ?? error
  }
}

/** What the journal's guard says of a doer, as the refusal that anybody without the role gets; null for anything else. */
function refusalOf(error: unknown): Error | null {
  const code = error instanceof QueryFailedError ? (error.driverError as { code?: unknown }).code : undefined
  if (code === 'FA404') return notFound()
  return code === 'FA403' ? forbidden() : null
}

async function listFarms(source: DataSource): Promise<FarmOnRound[]> {
  const rows: Pick<AccessRow, 'farm_id' | 'farm_name' | 'zone' | 'season_start'>[] = await source.query('SELECT * FROM every_farm()')
  return rows.map((row) => ({ farmId: row.farm_id, farmName: row.farm_name, zone: row.zone, seasonStart: row.season_start, seasons: null }))
}

async function listAccess(source: DataSource, accountId: string, at: Date): Promise<FarmActor[]> {
  const rows: AccessRow[] = await source.query(
    'SELECT f.*, a.kind, farm_asks_factor(f.farm_id) AS asks_factor FROM account_access($1, $2) f JOIN accounts a ON a.id = $1 ORDER BY f.farm_name, f.farm_id',
    [accountId, at],
  )
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
    origin: null,
    signsWith: row.kind === 'pin' ? 'pin' : 'password',
    asksFactor: row.asks_factor && row.role !== 'applicator',
  }))
}
