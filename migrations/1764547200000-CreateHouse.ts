import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
/** Seasons a certifier may read, '{2025,2026}'; unset for the farm's own people. */
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`

const FARM_TABLES = ['farm_heads', 'season_counters', 'people', 'blocks', 'materials', 'lots', 'lot_entries', 'sprayers']
/** Not for a certifier's eyes, whatever a route does. */
const OWN_PEOPLE_TABLES = ['grants', 'journal']
const SEASON_TABLES = ['application_records', 'record_lines', 'record_components', 'record_versions']
const EVIDENCE = ['record_versions', 'lot_entries', 'journal']
/** Tables that the two looking-over functions read on behalf of the owner role. */
const LOOKED_OVER = ['farms', 'people', 'grants', 'record_versions']

/** The first tables of the house, their policies, and the guards on what is evidence. */
export class CreateHouse1764547200000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of [...TABLES, ...GUARDS, ...FUNCTIONS]) await db.query(statement)
    for (const table of FARM_TABLES) await this.protect(db, table, `farm_id = ${FARM}`)
    for (const table of OWN_PEOPLE_TABLES) await this.protect(db, table, `farm_id = ${FARM} AND ${SEASONS} IS NULL`)
    for (const table of SEASON_TABLES) {
      await this.protect(db, table, `farm_id = ${FARM} AND (${SEASONS} IS NULL OR season = ANY (${SEASONS}))`)
    }
    await this.protect(db, 'farms', `id = ${FARM}`)
    for (const table of LOOKED_OVER) {
      await db.query(`CREATE POLICY ${table}_owner_reads ON ${table} FOR SELECT TO CURRENT_USER USING (true)`)
    }
  }

  /** Reading follows the condition; writing also needs that no season limit is set: a certifier writes nothing. */
  private async protect(db: QueryRunner, table: string, condition: string): Promise<void> {
    await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
    await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
    await db.query(`CREATE POLICY ${table}_read ON ${table} FOR SELECT USING (${condition})`)
    const write = `(${condition}) AND ${SEASONS} IS NULL`
    await db.query(`CREATE POLICY ${table}_insert ON ${table} FOR INSERT WITH CHECK (${write})`)
    await db.query(`CREATE POLICY ${table}_update ON ${table} FOR UPDATE USING (${write}) WITH CHECK (${write})`)
    await db.query(`CREATE POLICY ${table}_delete ON ${table} FOR DELETE USING (${write})`)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP FUNCTION find_check_code(text)')
    await db.query('DROP FUNCTION account_access(uuid, timestamptz)')
    await db.query('DROP TABLE lot_entries')
    for (const table of ['record_versions', 'record_components', 'record_lines', 'application_records']) await db.query(`DROP TABLE ${table}`)
    for (const table of ['lots', 'materials', 'sprayers', 'blocks', 'journal', 'grants', 'people', 'season_counters', 'farm_heads', 'farms', 'account_tokens', 'accounts', 'sessions', 'demo_seed']) {
      await db.query(`DROP TABLE ${table}`)
    }
    for (const name of ['refuse_change', 'guard_signed', 'guard_log']) await db.query(`DROP FUNCTION ${name}()`)
  }
}

const TABLES = [
  `CREATE TABLE accounts (
    id uuid NOT NULL, email text NOT NULL, name text NOT NULL, password_hash text,
    language text NOT NULL DEFAULT 'en', created_at timestamptz NOT NULL, deactivated_at timestamptz,
    CONSTRAINT accounts_pkey PRIMARY KEY (id),
    CONSTRAINT accounts_email_key UNIQUE (email),
    CONSTRAINT accounts_language_check CHECK (language IN ('en', 'es')))`,
  `CREATE TABLE account_tokens (
    token_hash text NOT NULL, account_id uuid NOT NULL, kind text NOT NULL,
    created_at timestamptz NOT NULL, expires_at timestamptz NOT NULL, used_at timestamptz,
    CONSTRAINT account_tokens_pkey PRIMARY KEY (token_hash),
    CONSTRAINT account_tokens_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id))`,
  `CREATE TABLE sessions (
    sid text NOT NULL, sess json NOT NULL, expire timestamptz NOT NULL,
    CONSTRAINT sessions_pkey PRIMARY KEY (sid))`,
  'CREATE INDEX sessions_expire_idx ON sessions (expire)',
  // Written last when the demo farm is made: without it a seeding broke off.
  'CREATE TABLE demo_seed (demo_farm_id uuid NOT NULL, demo_neighbour_id uuid NOT NULL, CONSTRAINT demo_seed_pkey PRIMARY KEY (demo_farm_id))',
  `CREATE TABLE farms (
    id uuid NOT NULL, name text NOT NULL, zone text NOT NULL, season_start text NOT NULL,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT farms_pkey PRIMARY KEY (id))`,
  `CREATE TABLE farm_heads (
    farm_id uuid NOT NULL, last_seq integer NOT NULL DEFAULT 0,
    CONSTRAINT farm_heads_pkey PRIMARY KEY (farm_id),
    CONSTRAINT farm_heads_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id))`,
  `CREATE TABLE season_counters (
    farm_id uuid NOT NULL, season integer NOT NULL, last_number integer NOT NULL DEFAULT 0,
    CONSTRAINT season_counters_pkey PRIMARY KEY (farm_id, season),
    CONSTRAINT season_counters_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id))`,
  `CREATE TABLE people (
    farm_id uuid NOT NULL, id uuid NOT NULL, account_id uuid, name text NOT NULL, name_salt text NOT NULL,
    role text NOT NULL, active boolean NOT NULL DEFAULT true, created_at timestamptz NOT NULL,
    CONSTRAINT people_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT people_farm_id_account_id_key UNIQUE (farm_id, account_id),
    CONSTRAINT people_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT people_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id),
    CONSTRAINT people_role_check CHECK (role IN ('owner', 'manager', 'applicator')))`,
  'CREATE INDEX people_account_id_idx ON people (account_id)',
  `CREATE TABLE grants (
    farm_id uuid NOT NULL, id uuid NOT NULL, account_id uuid NOT NULL, seasons integer[] NOT NULL,
    ends_on date NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT grants_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT grants_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT grants_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id))`,
  'CREATE INDEX grants_account_id_idx ON grants (account_id)',
  `CREATE TABLE blocks (
    farm_id uuid NOT NULL, id uuid NOT NULL, code text NOT NULL, name text NOT NULL, crop text,
    geometry jsonb NOT NULL, area_m2 numeric NOT NULL, perimeter_m numeric NOT NULL,
    version integer NOT NULL DEFAULT 1, revision integer NOT NULL DEFAULT 1,
    acknowledged jsonb NOT NULL DEFAULT '[]', creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT blocks_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT blocks_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT blocks_area_check CHECK (area_m2 > 0 AND area_m2 < 1e12))`,
  'CREATE UNIQUE INDEX blocks_farm_id_code_key ON blocks (farm_id, lower(code))',
  `CREATE TABLE materials (
    farm_id uuid NOT NULL, id uuid NOT NULL, name text NOT NULL, kind text NOT NULL, measured_in text NOT NULL,
    organic_status text NOT NULL, status_basis text, label jsonb,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT materials_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT materials_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT materials_measured_in_check CHECK (measured_in IN ('volume', 'mass')))`,
  'CREATE UNIQUE INDEX materials_farm_id_name_key ON materials (farm_id, lower(name))',
  `CREATE TABLE lots (
    farm_id uuid NOT NULL, id uuid NOT NULL, material_id uuid NOT NULL, code text NOT NULL, origin text NOT NULL,
    source text, received_on date NOT NULL, quantity numeric NOT NULL, unit text NOT NULL,
    left_quantity numeric NOT NULL, expires_on date,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT lots_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT lots_material_fkey FOREIGN KEY (farm_id, material_id) REFERENCES materials (farm_id, id),
    CONSTRAINT lots_quantity_check CHECK (quantity > 0 AND quantity < 1e9),
    CONSTRAINT lots_left_check CHECK (left_quantity >= 0 AND left_quantity < 1e9))`,
  'CREATE UNIQUE INDEX lots_farm_id_code_key ON lots (farm_id, lower(code))',
  'CREATE INDEX lots_farm_id_material_id_idx ON lots (farm_id, material_id)',
  `CREATE TABLE sprayers (
    farm_id uuid NOT NULL, id uuid NOT NULL, code text NOT NULL, name text NOT NULL, tank_l numeric NOT NULL,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT sprayers_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT sprayers_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT sprayers_tank_check CHECK (tank_l > 0 AND tank_l < 1e7))`,
  'CREATE UNIQUE INDEX sprayers_farm_id_code_key ON sprayers (farm_id, lower(code))',
  `CREATE TABLE application_records (
    farm_id uuid NOT NULL, id uuid NOT NULL, state text NOT NULL, content jsonb NOT NULL, computed jsonb NOT NULL,
    checks jsonb NOT NULL, acknowledged jsonb NOT NULL DEFAULT '[]', register_row jsonb NOT NULL,
    season integer, number integer, seq integer, digest text,
    version integer NOT NULL DEFAULT 0, revision integer NOT NULL DEFAULT 1,
    sort_at timestamptz NOT NULL, done_by_id uuid NOT NULL, entered_by_id uuid NOT NULL, signed_by_id uuid,
    device_at timestamptz, received_at timestamptz NOT NULL, signed_at timestamptz, creation_digest text NOT NULL,
    CONSTRAINT application_records_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT application_records_farm_id_season_number_key UNIQUE (farm_id, season, number),
    CONSTRAINT application_records_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT application_records_done_by_fkey FOREIGN KEY (farm_id, done_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT application_records_entered_by_fkey FOREIGN KEY (farm_id, entered_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT application_records_signed_by_fkey FOREIGN KEY (farm_id, signed_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT application_records_state_check CHECK (state IN ('draft', 'started', 'signed', 'withdrawn')),
    CONSTRAINT application_records_signed_check CHECK ((state IN ('signed', 'withdrawn')) =
      (season IS NOT NULL AND number IS NOT NULL AND seq IS NOT NULL AND digest IS NOT NULL
        AND signed_by_id IS NOT NULL AND signed_at IS NOT NULL)))`,
  'CREATE INDEX application_records_register_idx ON application_records (farm_id, sort_at DESC, id DESC)',
  `CREATE INDEX application_records_unsigned_idx ON application_records (farm_id, state, sort_at DESC, id DESC)
    WHERE state IN ('draft', 'started')`,
  `CREATE TABLE record_lines (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, position integer NOT NULL, block_id uuid NOT NULL,
    season integer, sort_at timestamptz NOT NULL,
    CONSTRAINT record_lines_pkey PRIMARY KEY (farm_id, record_id, position),
    CONSTRAINT record_lines_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
    CONSTRAINT record_lines_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id))`,
  'CREATE INDEX record_lines_block_idx ON record_lines (farm_id, block_id, sort_at DESC, record_id DESC)',
  `CREATE TABLE record_components (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, position integer NOT NULL, material_id uuid NOT NULL,
    lot_id uuid, amount numeric, unit text, season integer,
    CONSTRAINT record_components_pkey PRIMARY KEY (farm_id, record_id, position),
    CONSTRAINT record_components_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
    CONSTRAINT record_components_material_fkey FOREIGN KEY (farm_id, material_id) REFERENCES materials (farm_id, id),
    CONSTRAINT record_components_lot_fkey FOREIGN KEY (farm_id, lot_id) REFERENCES lots (farm_id, id))`,
  'CREATE INDEX record_components_lot_idx ON record_components (farm_id, lot_id)',
  `CREATE TABLE record_versions (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, version integer NOT NULL, seq integer NOT NULL,
    season integer NOT NULL, number text NOT NULL, canonical_text text NOT NULL, digest text NOT NULL,
    check_code text NOT NULL, signed_by_id uuid NOT NULL, signed_at timestamptz NOT NULL, reason text,
    CONSTRAINT record_versions_pkey PRIMARY KEY (farm_id, record_id, version),
    CONSTRAINT record_versions_farm_id_seq_key UNIQUE (farm_id, seq),
    CONSTRAINT record_versions_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
    CONSTRAINT record_versions_signed_by_fkey FOREIGN KEY (farm_id, signed_by_id) REFERENCES people (farm_id, id))`,
  'CREATE INDEX record_versions_check_code_idx ON record_versions (check_code)',
  `CREATE TABLE lot_entries (
    farm_id uuid NOT NULL, id uuid NOT NULL, lot_id uuid NOT NULL, kind text NOT NULL, amount numeric NOT NULL,
    left_after numeric NOT NULL, record_id uuid, reason text, person_id uuid NOT NULL, at timestamptz NOT NULL,
    CONSTRAINT lot_entries_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT lot_entries_lot_fkey FOREIGN KEY (farm_id, lot_id) REFERENCES lots (farm_id, id),
    CONSTRAINT lot_entries_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
    CONSTRAINT lot_entries_person_fkey FOREIGN KEY (farm_id, person_id) REFERENCES people (farm_id, id),
    CONSTRAINT lot_entries_kind_check CHECK (kind IN ('received', 'drawn', 'counted')))`,
  'CREATE INDEX lot_entries_lot_idx ON lot_entries (farm_id, lot_id, at)',
  `CREATE TABLE journal (
    farm_id uuid NOT NULL, id uuid NOT NULL, at timestamptz NOT NULL, person_id uuid, account_id uuid,
    action text NOT NULL, subject_id uuid, detail jsonb NOT NULL DEFAULT '{}',
    CONSTRAINT journal_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT journal_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id))`,
  'CREATE INDEX journal_farm_id_at_idx ON journal (farm_id, at DESC, id DESC)',
]

const GUARDS = [
  `CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN RAISE EXCEPTION '% keeps what was written: % refused', TG_TABLE_NAME, TG_OP USING ERRCODE = '42501'; END $$`,
  `CREATE FUNCTION guard_signed() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.state IN ('signed', 'withdrawn') AND NOT (
        (NEW.state = OLD.state OR NEW.state = 'withdrawn') AND NEW.season = OLD.season AND NEW.number = OLD.number
        AND NEW.version >= OLD.version AND (NEW.version > OLD.version OR
          (NEW.content, NEW.digest, NEW.seq, NEW.signed_at, NEW.signed_by_id) IS NOT DISTINCT FROM
          (OLD.content, OLD.digest, OLD.seq, OLD.signed_at, OLD.signed_by_id)))
      THEN RAISE EXCEPTION 'a signed record changes by a new version only' USING ERRCODE = '42501'; END IF;
      RETURN NEW;
    END $$`,
  'CREATE TRIGGER application_records_signed_stand BEFORE UPDATE ON application_records FOR EACH ROW EXECUTE FUNCTION guard_signed()',
  'ALTER TABLE application_records ENABLE ALWAYS TRIGGER application_records_signed_stand',
  `CREATE FUNCTION guard_log() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF NEW.last_seq <> OLD.last_seq + 1 THEN RAISE EXCEPTION 'the log goes on by one' USING ERRCODE = '42501'; END IF;
      RETURN NEW;
    END $$`,
  'CREATE TRIGGER farm_heads_go_on BEFORE UPDATE ON farm_heads FOR EACH ROW EXECUTE FUNCTION guard_log()',
  'ALTER TABLE farm_heads ENABLE ALWAYS TRIGGER farm_heads_go_on',
  ...EVIDENCE.flatMap((table) => [
    `CREATE TRIGGER ${table}_rows_stand BEFORE UPDATE OR DELETE ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change()`,
    `CREATE TRIGGER ${table}_table_stands BEFORE TRUNCATE ON ${table} FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
    `ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_rows_stand`,
    `ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${table}_table_stands`,
  ]),
]

const FUNCTIONS = [
  `CREATE FUNCTION account_access(account uuid, at timestamptz)
    RETURNS TABLE (farm_id uuid, farm_name text, zone text, season_start text, role text, person_id uuid, person_name text, seasons integer[])
    LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
      SELECT f.id, f.name, f.zone, f.season_start, p.role, p.id, p.name, NULL::integer[]
        FROM public.people p JOIN public.farms f ON f.id = p.farm_id JOIN public.accounts a ON a.id = p.account_id
        WHERE p.account_id = account AND p.active AND a.deactivated_at IS NULL
      UNION ALL
      SELECT f.id, f.name, f.zone, f.season_start, 'certifier', NULL, NULL, array_agg(DISTINCT s.season ORDER BY s.season)
        FROM public.grants g JOIN public.farms f ON f.id = g.farm_id
          JOIN public.accounts a ON a.id = g.account_id AND a.deactivated_at IS NULL CROSS JOIN LATERAL unnest(g.seasons) AS s (season)
        WHERE g.account_id = account AND (at AT TIME ZONE f.zone)::date <= g.ends_on
          AND NOT EXISTS (SELECT 1 FROM public.people p WHERE p.farm_id = g.farm_id AND p.account_id = account AND p.active)
        GROUP BY f.id, f.name, f.zone, f.season_start
      ORDER BY 2, 1 $$`,
  'REVOKE ALL ON FUNCTION account_access(uuid, timestamptz) FROM PUBLIC',
  `CREATE FUNCTION find_check_code(code text)
    RETURNS TABLE (number text, seq integer, version integer, signed_at timestamptz, digest text)
    LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
      SELECT v.number, v.seq, v.version, v.signed_at, v.digest FROM public.record_versions v WHERE v.check_code = code $$`,
  'REVOKE ALL ON FUNCTION find_check_code(text) FROM PUBLIC',
]
