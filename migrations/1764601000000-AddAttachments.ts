import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
/** Seasons a certifier may read; unset for the farm's own people. */
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`

/** Photos and papers of records. A certifier sees those of the granted seasons, once their record is signed. */
export class AddAttachments1764601000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of [TABLE, INDEX, ...GUARDS, ...POLICIES]) await db.query(statement)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP TABLE attachments')
    await db.query('DROP FUNCTION guard_attachment()')
  }
}

const TABLE = `CREATE TABLE attachments (
  farm_id uuid NOT NULL, id uuid NOT NULL, record_id uuid NOT NULL, kind text NOT NULL, label text NOT NULL,
  type text NOT NULL, bytes integer NOT NULL, digest text NOT NULL,
  served_digest text, served_bytes integer, width integer, height integer,
  taken_at timestamptz, uploaded_by_id uuid NOT NULL, uploaded_at timestamptz NOT NULL,
  season integer, signed_version integer, removed_at timestamptz, creation_digest text NOT NULL,
  CONSTRAINT attachments_pkey PRIMARY KEY (farm_id, id),
  CONSTRAINT attachments_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
  CONSTRAINT attachments_uploaded_by_fkey FOREIGN KEY (farm_id, uploaded_by_id) REFERENCES people (farm_id, id),
  CONSTRAINT attachments_kind_check CHECK (kind IN ('photo', 'paper')),
  CONSTRAINT attachments_bytes_check CHECK (bytes > 0),
  CONSTRAINT attachments_served_check CHECK ((type = 'application/pdf') =
    (served_digest IS NULL AND served_bytes IS NULL AND width IS NULL AND height IS NULL)))`

const INDEX = 'CREATE INDEX attachments_record_idx ON attachments (farm_id, record_id, uploaded_at, id)'

const GUARDS = [
  // A file stands as it came in. Signing names it; until then it can be taken back, and what was taken back stays so.
  `CREATE FUNCTION guard_attachment() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.signed_version IS NOT NULL OR OLD.removed_at IS NOT NULL
        OR (OLD.season IS NOT NULL AND NEW.season IS DISTINCT FROM OLD.season)
        OR (to_jsonb(NEW) - 'season' - 'signed_version' - 'removed_at') <> (to_jsonb(OLD) - 'season' - 'signed_version' - 'removed_at')
      THEN RAISE EXCEPTION 'a file of a record stands as it came in' USING ERRCODE = '42501'; END IF;
      RETURN NEW;
    END $$`,
  'CREATE TRIGGER attachments_stand BEFORE UPDATE ON attachments FOR EACH ROW EXECUTE FUNCTION guard_attachment()',
  'CREATE TRIGGER attachments_rows_stay BEFORE DELETE ON attachments FOR EACH ROW EXECUTE FUNCTION refuse_change()',
  'CREATE TRIGGER attachments_table_stands BEFORE TRUNCATE ON attachments FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()',
  ...['attachments_stand', 'attachments_rows_stay', 'attachments_table_stands'].map((name) => `ALTER TABLE attachments ENABLE ALWAYS TRIGGER ${name}`),
]

const WRITE = `${FARM} AND ${SEASONS} IS NULL`
const POLICIES = [
  'ALTER TABLE attachments ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE attachments FORCE ROW LEVEL SECURITY',
  `CREATE POLICY attachments_read ON attachments FOR SELECT USING (${FARM} AND (${SEASONS} IS NULL OR season = ANY (${SEASONS})))`,
  `CREATE POLICY attachments_insert ON attachments FOR INSERT WITH CHECK (${WRITE})`,
  `CREATE POLICY attachments_update ON attachments FOR UPDATE USING (${WRITE}) WITH CHECK (${WRITE})`,
]
