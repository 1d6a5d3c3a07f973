import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`
const READ = `farm_id = ${FARM} AND (${SEASONS} IS NULL OR season = ANY (${SEASONS}))`
const WRITE = `farm_id = ${FARM} AND ${SEASONS} IS NULL`

/** Amendments, withdrawals and reviews of records, drafts that may be taken back, lots that get something back, flow of a sprayer. */
export class WholeRecords1764600000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of UP) await db.query(statement)
  }

  async down(db: QueryRunner): Promise<void> {
    for (const statement of DOWN) await db.query(statement)
  }
}

const UP = [
  'ALTER TABLE sprayers ADD COLUMN flow_l_per_min numeric',
  'ALTER TABLE sprayers ADD CONSTRAINT sprayers_flow_check CHECK (flow_l_per_min > 0 AND flow_l_per_min < 1e7)',
  'ALTER TABLE lot_entries DROP CONSTRAINT lot_entries_kind_check',
  `ALTER TABLE lot_entries ADD CONSTRAINT lot_entries_kind_check CHECK (kind IN ('received', 'drawn', 'counted', 'returned'))`,
  `ALTER TABLE record_versions ADD COLUMN entry text NOT NULL DEFAULT 'signed'`,
  `ALTER TABLE record_versions ADD CONSTRAINT record_versions_entry_check CHECK (entry IN ('signed', 'amended', 'withdrawn'))`,
  `CREATE TABLE record_reviews (
    farm_id uuid NOT NULL, id uuid NOT NULL, record_id uuid NOT NULL, version integer NOT NULL, season integer NOT NULL,
    reviewed_by_id uuid NOT NULL, at timestamptz NOT NULL, note text,
    CONSTRAINT record_reviews_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT record_reviews_version_fkey FOREIGN KEY (farm_id, record_id, version) REFERENCES record_versions (farm_id, record_id, version),
    CONSTRAINT record_reviews_reviewed_by_fkey FOREIGN KEY (farm_id, reviewed_by_id) REFERENCES people (farm_id, id))`,
  'CREATE INDEX record_reviews_record_idx ON record_reviews (farm_id, record_id, at)',
  'ALTER TABLE record_reviews ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE record_reviews FORCE ROW LEVEL SECURITY',
  `CREATE POLICY record_reviews_read ON record_reviews FOR SELECT USING (${READ})`,
  `CREATE POLICY record_reviews_insert ON record_reviews FOR INSERT WITH CHECK (${WRITE})`,
  'CREATE TRIGGER record_reviews_rows_stand BEFORE UPDATE OR DELETE ON record_reviews FOR EACH ROW EXECUTE FUNCTION refuse_change()',
  'CREATE TRIGGER record_reviews_table_stands BEFORE TRUNCATE ON record_reviews FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()',
  'ALTER TABLE record_reviews ENABLE ALWAYS TRIGGER record_reviews_rows_stand',
  'ALTER TABLE record_reviews ENABLE ALWAYS TRIGGER record_reviews_table_stands',
  // A draft may go; what was signed never does, whoever asks.
  `CREATE FUNCTION keep_signed() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.state IN ('signed', 'withdrawn') THEN RAISE EXCEPTION 'a signed record stays' USING ERRCODE = '42501'; END IF;
      RETURN OLD;
    END $$`,
  'CREATE TRIGGER application_records_signed_stay BEFORE DELETE ON application_records FOR EACH ROW EXECUTE FUNCTION keep_signed()',
  'ALTER TABLE application_records ENABLE ALWAYS TRIGGER application_records_signed_stay',
]

const DOWN = [
  'DROP TRIGGER application_records_signed_stay ON application_records',
  'DROP FUNCTION keep_signed()',
  'DROP TABLE record_reviews',
  'ALTER TABLE record_versions DROP COLUMN entry',
  'ALTER TABLE lot_entries DROP CONSTRAINT lot_entries_kind_check',
  `ALTER TABLE lot_entries ADD CONSTRAINT lot_entries_kind_check CHECK (kind IN ('received', 'drawn', 'counted'))`,
  'ALTER TABLE sprayers DROP COLUMN flow_l_per_min',
]
