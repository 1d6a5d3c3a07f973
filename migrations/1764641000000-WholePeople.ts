import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
/** Neither a shared phone nor somebody's papers are for a certifier's eyes. */
const OWN = `${FARM} AND nullif(current_setting('app.seasons', true), '') IS NULL`

/** People without e-mail, what a session is known by, the second factor, shared phones, and papers of people. */
export class WholePeople1764641000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of [...ACCOUNTS, ...SESSIONS, ...FARM_COLUMNS, ...TABLES, ...FUNCTIONS]) await db.query(statement)
    for (const table of ['shared_phones', 'person_papers']) {
      await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
      await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
      await db.query(`CREATE POLICY ${table}_read ON ${table} FOR SELECT USING (${OWN})`)
      await db.query(`CREATE POLICY ${table}_insert ON ${table} FOR INSERT WITH CHECK (${OWN})`)
      await db.query(`CREATE POLICY ${table}_update ON ${table} FOR UPDATE USING (${OWN}) WITH CHECK (${OWN})`)
    }
  }

  /** Accounts without e-mail get one that nobody can write to: the house before had no other kind. */
  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP FUNCTION farm_asks_factor(uuid)')
    for (const table of ['person_papers', 'shared_phones', 'recovery_codes']) await db.query(`DROP TABLE ${table}`)
    await db.query('ALTER TABLE attachments DROP COLUMN about')
    await db.query('ALTER TABLE record_versions DROP COLUMN signed_with')
    await db.query('ALTER TABLE farms DROP COLUMN asks_second_factor')
    await db.query('ALTER TABLE people DROP COLUMN revision, DROP COLUMN creation_digest')
    await db.query('DROP INDEX sessions_account_idx')
    for (const column of ['id', 'account_id', 'opened_at', 'seen_at', 'ends_at', 'agent', 'shared_phone']) await db.query(`ALTER TABLE sessions DROP COLUMN ${column}`)
    await db.query('ALTER TABLE accounts DROP CONSTRAINT accounts_kind_check')
    await db.query("UPDATE accounts SET email = id || '@nobody.invalid' WHERE email IS NULL")
    await db.query('ALTER TABLE accounts ALTER COLUMN email SET NOT NULL')
    for (const column of ['kind', 'preferences', 'revision', 'totp_secret', 'totp_pending', 'totp_step', 'totp_since']) await db.query(`ALTER TABLE accounts DROP COLUMN ${column}`)
  }
}

const ACCOUNTS = [
  'ALTER TABLE accounts ALTER COLUMN email DROP NOT NULL',
  "ALTER TABLE accounts ADD COLUMN kind text NOT NULL DEFAULT 'email'",
  "ALTER TABLE accounts ADD CONSTRAINT accounts_kind_check CHECK (kind IN ('email', 'pin') AND (kind = 'pin') = (email IS NULL))",
  "ALTER TABLE accounts ADD COLUMN preferences jsonb NOT NULL DEFAULT '{}'",
  'ALTER TABLE accounts ADD COLUMN revision integer NOT NULL DEFAULT 1',
  'ALTER TABLE accounts ADD COLUMN totp_secret text, ADD COLUMN totp_pending text, ADD COLUMN totp_step integer, ADD COLUMN totp_since timestamptz',
  `CREATE TABLE recovery_codes (
    account_id uuid NOT NULL, code_digest text NOT NULL, created_at timestamptz NOT NULL, used_at timestamptz,
    CONSTRAINT recovery_codes_pkey PRIMARY KEY (account_id, code_digest),
    CONSTRAINT recovery_codes_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id))`,
]

// A session is known by an id of its own: the one in the cookie opens it and is shown to nobody.
const SESSIONS = [
  'ALTER TABLE sessions ADD COLUMN id uuid NOT NULL DEFAULT gen_random_uuid(), ADD COLUMN account_id uuid, ADD COLUMN opened_at timestamptz, ADD COLUMN seen_at timestamptz, ADD COLUMN ends_at timestamptz, ADD COLUMN agent text, ADD COLUMN shared_phone text',
  "UPDATE sessions SET account_id = (sess #>> '{passport,user}')::uuid, opened_at = now(), seen_at = now(), ends_at = expire WHERE sess #>> '{passport,user}' IS NOT NULL",
  'CREATE INDEX sessions_account_idx ON sessions (account_id)',
]

const FARM_COLUMNS = [
  "ALTER TABLE people ADD COLUMN revision integer NOT NULL DEFAULT 1, ADD COLUMN creation_digest text NOT NULL DEFAULT ''",
  'ALTER TABLE farms ADD COLUMN asks_second_factor boolean NOT NULL DEFAULT false',
  "ALTER TABLE record_versions ADD COLUMN signed_with text NOT NULL DEFAULT 'password'",
  "ALTER TABLE record_versions ADD CONSTRAINT record_versions_signed_with_check CHECK (signed_with IN ('password', 'pin'))",
  "ALTER TABLE attachments ADD COLUMN about text NOT NULL DEFAULT 'record'",
]

const TABLES = [
  `CREATE TABLE shared_phones (
    farm_id uuid NOT NULL, id uuid NOT NULL, name text NOT NULL, secret_digest text NOT NULL,
    enrolled_by_id uuid NOT NULL, enrolled_at timestamptz NOT NULL, last_used_at timestamptz, revoked_at timestamptz, creation_digest text NOT NULL,
    CONSTRAINT shared_phones_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT shared_phones_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT shared_phones_enrolled_by_fkey FOREIGN KEY (farm_id, enrolled_by_id) REFERENCES people (farm_id, id))`,
  `CREATE TABLE person_papers (
    farm_id uuid NOT NULL, id uuid NOT NULL, person_id uuid NOT NULL, kind text NOT NULL, title text NOT NULL,
    number text, issued_on date, expires_on date, ended_at timestamptz,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT person_papers_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT person_papers_person_fkey FOREIGN KEY (farm_id, person_id) REFERENCES people (farm_id, id),
    CONSTRAINT person_papers_kind_check CHECK (kind IN ('training', 'licence')),
    CONSTRAINT person_papers_days_check CHECK (expires_on >= issued_on))`,
  'CREATE INDEX person_papers_person_idx ON person_papers (farm_id, person_id, id)',
]

const FUNCTIONS = [
  // Asked of every farm in an account's world before one of them is open.
  `CREATE FUNCTION farm_asks_factor(farm uuid) RETURNS boolean
    LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
      SELECT f.asks_second_factor FROM public.farms f WHERE f.id = farm $$`,
  'REVOKE ALL ON FUNCTION farm_asks_factor(uuid) FROM PUBLIC',
]
