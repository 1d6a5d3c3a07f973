import type { MigrationInterface, QueryRunner } from 'typeorm'

const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`
/** The farm that is named, or the nil id where none is: letters of the house stand under that, for a key takes no null. */
const WHOSE = `coalesce(nullif(current_setting('app.farm_id', true), '')::uuid, '00000000-0000-0000-0000-000000000000'::uuid)`
/** Whoever carries letters out, of every farm. */
const POST = `current_setting('app.post', true) = 'on'`

/** Letters written in the transaction of what they tell of, and sent afterwards; timed work goes over all farms. */
export class AddMail1764640000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of STATEMENTS) await db.query(statement)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP FUNCTION every_farm()')
    await db.query('DROP TABLE letters')
    await db.query('DROP FUNCTION tell_of_letters()')
  }
}

const STATEMENTS = [
  `CREATE TABLE letters (
    farm_id uuid NOT NULL, id uuid NOT NULL, kind text NOT NULL, params jsonb NOT NULL, language text NOT NULL,
    to_email text NOT NULL, to_name text, reply_email text, reply_name text, message_id text NOT NULL,
    state text NOT NULL DEFAULT 'waiting', tries integer NOT NULL DEFAULT 0, created_at timestamptz NOT NULL,
    next_try_at timestamptz NOT NULL, claimed_until timestamptz, sent_at timestamptz, last_fault jsonb,
    once text, creation_digest text NOT NULL,
    CONSTRAINT letters_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT letters_farm_id_once_key UNIQUE (farm_id, once),
    CONSTRAINT letters_language_check CHECK (language IN ('en', 'es')),
    CONSTRAINT letters_state_check CHECK (state IN ('waiting', 'sent', 'dead')))`,
  "CREATE INDEX letters_due_idx ON letters (next_try_at) WHERE state = 'waiting'",
  'CREATE INDEX letters_farm_id_created_at_idx ON letters (farm_id, created_at DESC, id DESC)',
  'ALTER TABLE letters ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE letters FORCE ROW LEVEL SECURITY',
  `CREATE POLICY letters_read ON letters FOR SELECT USING ((farm_id = ${WHOSE} AND ${SEASONS} IS NULL) OR ${POST})`,
  `CREATE POLICY letters_insert ON letters FOR INSERT WITH CHECK (farm_id = ${WHOSE} AND ${SEASONS} IS NULL)`,
  `CREATE POLICY letters_update ON letters FOR UPDATE USING (${POST}) WITH CHECK (${POST})`,
  // Told when the transaction commits, and not before; the post also looks by itself, should nobody have listened.
  `CREATE FUNCTION tell_of_letters() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN PERFORM pg_notify('drenchleaf_letters', ''); RETURN NULL; END $$`,
  'CREATE TRIGGER letters_are_told AFTER INSERT ON letters FOR EACH STATEMENT EXECUTE FUNCTION tell_of_letters()',
  `CREATE FUNCTION every_farm() RETURNS TABLE (farm_id uuid, farm_name text, zone text, season_start text)
    LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
      SELECT f.id, f.name, f.zone, f.season_start FROM public.farms f ORDER BY f.id $$`,
  'REVOKE ALL ON FUNCTION every_farm() FROM PUBLIC',
]
