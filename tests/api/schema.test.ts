import pg from 'pg'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { createOwnerSource } from '../../server/database/dataSource.ts'
import { openHouse, type TestHouse } from '../support/openHouse.ts'

let house: TestHouse
let source: DataSource
let client: pg.Client

beforeAll(async () => {
  house = await openHouse()
  source = await createOwnerSource(house.ownerUrl).initialize()
  client = new pg.Client({ connectionString: house.ownerUrl })
  await client.connect()
})
afterAll(async () => {
  await client.end()
  await source.destroy()
  await house.close()
})

const rows = async (sql: string): Promise<Record<string, unknown>[]> => (await client.query<Record<string, unknown>>(sql)).rows

it('gives entities that agree with the migrations', async () => {
  const log = await source.driver.createSchemaBuilder().log()
  expect(log.upQueries.map(({ query }) => query)).toEqual([])
})

it('forces row-level security on every table that has a farm, and on farms', async () => {
  const bare = await rows(`SELECT c.relname FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
    WHERE n.nspname = 'public' AND c.relkind = 'r' AND NOT (c.relrowsecurity AND c.relforcerowsecurity)
      AND (c.relname = 'farms' OR EXISTS (SELECT 1 FROM pg_attribute a WHERE a.attrelid = c.oid AND a.attname = 'farm_id'))`)
  expect(bare).toEqual([])
})

it('starts every key of a farm table with the farm', async () => {
  const loose = await rows(`SELECT k.conname FROM pg_constraint k JOIN pg_class c ON c.oid = k.conrelid
    JOIN pg_attribute a ON a.attrelid = c.oid AND a.attname = 'farm_id'
    WHERE k.contype IN ('p', 'u') AND k.conkey[1] <> a.attnum`)
  expect(loose).toEqual([])
})

it('names the farm in every foreign key between two farm tables', async () => {
  const loose = await rows(`SELECT k.conname FROM pg_constraint k
    JOIN pg_attribute a ON a.attrelid = k.conrelid AND a.attname = 'farm_id'
    JOIN pg_attribute b ON b.attrelid = k.confrelid AND b.attname = 'farm_id'
    WHERE k.contype = 'f' AND NOT (a.attnum = ANY (k.conkey) AND b.attnum = ANY (k.confkey))`)
  expect(loose).toEqual([])
})

it('cascades nothing', async () => {
  expect(await rows("SELECT conname FROM pg_constraint WHERE contype = 'f' AND (confdeltype <> 'a' OR confupdtype <> 'a')")).toEqual([])
})

it('gives the app role no power over the house', async () => {
  const [role] = await rows("SELECT rolsuper, rolbypassrls, rolcreaterole, rolcreatedb FROM pg_roles WHERE rolname = 'drenchleaf_app'")
  expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false })
  expect(await rows("SELECT tablename FROM pg_tables WHERE tableowner = 'drenchleaf_app'")).toEqual([])
  const evidence = await rows(`SELECT table_name, privilege_type FROM information_schema.role_table_grants
    WHERE grantee = 'drenchleaf_app' AND table_name IN ('record_versions', 'journal', 'lot_entries', 'attachments', 'block_boundaries', 'farm_events', 'farm_event_blocks', 'calibrations') AND privilege_type NOT IN ('SELECT', 'INSERT')`)
  expect(evidence).toEqual([])
})

it('lets only seven functions look over farm borders, each with a fixed search path', async () => {
  const functions = await rows(`SELECT p.proname, p.proconfig FROM pg_proc p JOIN pg_namespace n ON n.oid = p.pronamespace
    WHERE n.nspname = 'public' AND p.prosecdef ORDER BY p.proname`)
  const searchPath = ['search_path=pg_catalog, public, pg_temp']
  expect(functions.map(({ proname }) => proname)).toEqual(['account_access', 'account_ended_grants', 'account_grants', 'every_farm', 'farm_asks_factor', 'find_check_code', 'find_season_code'])
  expect(new Set(functions.map(({ proconfig }) => String(proconfig)))).toEqual(new Set(searchPath))
})

it('can be taken back to nothing and made again', async () => {
  const copy = await openHouse()
  const own = await createOwnerSource(copy.ownerUrl).initialize()
  for (let undone = 0; undone < own.migrations.length; undone += 1) await own.undoLastMigration()
  expect(await own.query("SELECT tablename FROM pg_tables WHERE schemaname = 'public' AND tablename <> 'migrations'")).toEqual([])
  await own.runMigrations()
  await own.destroy()
  await copy.close()
})
