import { randomUUID } from 'node:crypto'
import pg from 'pg'
import { buildGround, buildTemplates, END, START, type SeedGround } from './seedTemplates.ts'

/** One connection, inside or outside a transaction: `(sql, params) => manager.query(sql, params)` or a client's rows. */
export type RunSql = (sql: string, params?: unknown[]) => Promise<unknown[]>

export interface SeedWish {
  farmId: string
  count: number
  /** The work lies between these instants, evenly spread; ten years up to the middle of 2026 unless said otherwise. */
  from?: string
  to?: string
}

/**
 * Fills a farm with records in one statement: 120 of them worked out by the program itself, each written many times with its own
 * times, number and state (95 % signed, some withdrawn, started or late), with all that finds them. Works on any connection on
 * which the farm is named: the app role's inside `inFarm`, or the owner's (`seedAsOwner`). Not written: signed texts (record_versions), lot
 * ledgers and the log's head, so that what reads those finds nothing of these records.
 * @returns the blocks, materials, lots and people that the records name.
 */
export async function seedManyRecords(run: RunSql, { farmId, count, from = '2016-07-01T00:00:00Z', to = '2026-06-15T00:00:00Z' }: SeedWish): Promise<SeedGround> {
  const [farm] = await run('SELECT zone FROM farms WHERE id = $1', [farmId]) as [{ zone: string }]
  const ground = buildGround(farmId, await seedPeople(run, farmId))
  await seedGround(run, ground)
  const templates = buildTemplates(ground, farm.zone).map((template, turn) => ({ turn, ...template }))
  await run(SEED, [farmId, count, from, to, JSON.stringify(templates), templates.length])
  return ground
}

/** The same over the owner's address, which can also tell the planner what is there. */
export async function seedAsOwner(ownerUrl: string, wish: SeedWish): Promise<SeedGround> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  try {
    await client.query("SELECT set_config('app.farm_id', $1, false)", [wish.farmId])
    const ground = await seedManyRecords(async (sql, params) => (await client.query(sql, params)).rows, wish)
    await client.query('VACUUM ANALYZE')
    return ground
  } finally {
    await client.end()
  }
}

async function seedPeople(run: RunSql, farmId: string): Promise<SeedGround['people']> {
  for (const name of ['Oda Verrill', 'Ruan Abel', 'Inés Peña', 'Tam Orrin']) {
    await run(
      `INSERT INTO people (farm_id, id, name, name_salt, role, created_at) SELECT $1, $2, $3, md5($3), 'applicator', now()
       WHERE NOT EXISTS (SELECT 1 FROM people WHERE farm_id = $1 AND name = $3)`,
      [farmId, randomUUID(), name],
    )
  }
  return await run("SELECT id, name FROM people WHERE farm_id = $1 AND role <> 'manager' ORDER BY id", [farmId]) as SeedGround['people']
}

async function seedGround(run: RunSql, { blocks, materials, lots }: SeedGround): Promise<void> {
  for (const block of blocks) {
    await run(
      `INSERT INTO blocks (farm_id, id, code, name, crop, geometry, area_m2, perimeter_m, creation_digest, created_at, from_ids, into_ids) VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, '{}', '{}')`,
      [block.farmId, block.id, block.code, block.name, block.crop, JSON.stringify(block.geometry), block.areaM2, block.perimeterM, block.creationDigest, block.createdAt],
    )
  }
  for (const material of materials) {
    await run(
      `INSERT INTO materials (farm_id, id, name, kind, measured_in, organic_status, status_basis, creation_digest, created_at) VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9)`,
      [material.farmId, material.id, material.name, material.kind, material.measuredIn, material.organicStatus, material.statusBasis, material.creationDigest, material.createdAt],
    )
  }
  for (const lot of lots) {
    await run(
      `INSERT INTO lots (farm_id, id, material_id, code, origin, received_on, quantity, unit, left_quantity, creation_digest, created_at) VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11)`,
      [lot.farmId, lot.id, lot.materialId, lot.code, lot.origin, lot.receivedOn, lot.quantity, lot.unit, lot.leftQuantity, lot.creationDigest, lot.createdAt],
    )
  }
}

const ISO = `'YYYY-MM-DD"T"HH24:MI:SS"Z"'`
const iso = (instant: string): string => `to_char(${instant} AT TIME ZONE 'UTC', ${ISO})`
const placed = (text: string): string => `replace(replace(${text}, '${START}', ${iso('started_at')}), '${END}', ${iso('ended_at')})::jsonb`

/** $1 farm, $2 how many, $3 from, $4 to, $5 templates, $6 how many of them. */
const SEED = `WITH template AS MATERIALIZED (
  SELECT t.* FROM jsonb_to_recordset($5::jsonb) AS t (turn integer, content text, computed jsonb, checks jsonb, "row" text,
    terms text[], kg numeric, "doneById" uuid, "blockIds" uuid[], components jsonb)
), worked AS (
  SELECT n, n % 97 = 0 AS withdrawn, n % 53 = 0 AS unsigned, n % 23 = 0 AS late, (n * 7919) % $6 AS turn,
    date_trunc('minute', $3::timestamptz + n * (($4::timestamptz - $3::timestamptz) / $2)) AS started_at
  FROM generate_series(1, $2::integer) AS n
), timed AS (
  SELECT w.*, started_at + interval '47 minutes' AS ended_at,
    started_at + CASE WHEN late THEN interval '41 hours' ELSE interval '70 minutes' END AS signed_at,
    extract(year FROM day)::integer - (to_char(day, 'MM-DD') < f.season_start)::integer AS work_season,
    (lpad(to_hex((extract(epoch FROM started_at) * 1000)::bigint), 12, '0') || '7' || left(md5($1::text || n), 3) || '8' || left(md5(n || $1::text), 15))::uuid AS id
  FROM worked w JOIN farms f ON f.id = ($1::text)::uuid, LATERAL (SELECT (started_at AT TIME ZONE f.zone)::date AS day) AS d
), numbered AS (
  SELECT t.*, CASE WHEN unsigned THEN NULL ELSE work_season END AS season,
    CASE WHEN unsigned THEN NULL ELSE coalesce(c.last_number, 0) + row_number() OVER (PARTITION BY work_season, unsigned ORDER BY started_at, t.id) END AS number
  FROM timed t LEFT JOIN season_counters c ON c.farm_id = ($1::text)::uuid AND c.season = t.work_season
), made AS MATERIALIZED (
  SELECT m.n, m.id, m.work_season, m.season, m.number::integer AS number, m.started_at, m.late AND NOT m.unsigned AS late, t."doneById" AS person, t.terms, t.kg, t."blockIds" AS blocks, t.components,
    CASE WHEN unsigned THEN 'started' WHEN withdrawn THEN 'withdrawn' ELSE 'signed' END AS state, t.computed, t.checks,
    CASE WHEN unsigned THEN NULL ELSE signed_at END AS signed_at, started_at + interval '60 minutes' AS received_at,
    ${placed('t.content')} AS content, season || '-' || lpad(number::text, greatest(4, length(number::text)), '0') AS full_number,
    ${placed('t.row')} || CASE WHEN unsigned THEN '{}' ELSE jsonb_build_object('number', season || '-' || lpad(number::text, greatest(4, length(number::text)), '0'), 'season', season, 'version', 1,
      'signedAt', ${iso('signed_at')}, 'lateHours', CASE WHEN late THEN 40 END) END AS register_row
  FROM numbered m JOIN template t ON t.turn = m.turn
), records AS (
  INSERT INTO application_records (farm_id, id, state, content, computed, checks, register_row, season, number, seq, digest, version,
    sort_at, done_by_id, entered_by_id, signed_by_id, received_at, signed_at, creation_digest)
  SELECT ($1::text)::uuid, id, state, content, computed, checks, register_row, season, number, CASE WHEN season IS NOT NULL THEN n END,
    CASE WHEN season IS NOT NULL THEN encode(sha256(id::text::bytea), 'hex') END, CASE WHEN season IS NULL THEN 0 ELSE 1 END,
    started_at, person, person, CASE WHEN season IS NOT NULL THEN person END, received_at, signed_at, 'seeded' FROM made
), counters AS (
  INSERT INTO season_counters (farm_id, season, last_number) SELECT ($1::text)::uuid, season, max(number) FROM made WHERE season IS NOT NULL GROUP BY season
  ON CONFLICT (farm_id, season) DO UPDATE SET last_number = excluded.last_number
), lines AS (
  INSERT INTO record_lines (farm_id, record_id, position, block_id, season, sort_at)
  SELECT ($1::text)::uuid, id, line.place - 1, line.block, season, started_at FROM made, unnest(blocks) WITH ORDINALITY AS line (block, place)
), components AS (
  INSERT INTO record_components (farm_id, record_id, position, material_id, lot_id, amount, unit, season)
  SELECT ($1::text)::uuid, id, part.place - 1, (part.one->>'materialId')::uuid, (part.one->>'lotId')::uuid, (part.one->>'value')::numeric, part.one->>'unit', season
  FROM made, jsonb_array_elements(components) WITH ORDINALITY AS part (one, place)
), entries AS (
  INSERT INTO register_entries (farm_id, record_id, state, method, season, work_season, sort_at, number_sort, area_sort, area_ha, total_l, total_kg, late)
  SELECT ($1::text)::uuid, id, state, register_row->>'method', season, work_season, started_at, coalesce(season * 10000000::bigint + number, 9000000000000000),
    (register_row->>'areaHa')::float8, (register_row->>'areaHa')::numeric, (register_row->>'totalL')::numeric, kg, late FROM made
)
INSERT INTO record_terms (farm_id, record_id, term, season, work_season, sort_at)
SELECT ($1::text)::uuid, id, term, season, work_season, started_at FROM made, LATERAL (
  SELECT unnest(terms) UNION SELECT 's:' || state UNION SELECT 'r:waiting' WHERE state = 'signed'
  UNION SELECT 'w:' || unnest(ARRAY[full_number, split_part(full_number, '-', 1), split_part(full_number, '-', 2), number::text]) WHERE season IS NOT NULL
) AS found (term)`
