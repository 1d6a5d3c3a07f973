import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
const WRITE = `${FARM} AND nullif(current_setting('app.seasons', true), '') IS NULL`

/** The farm's profile, what is fitted to its sprayers, their calibrations, and the first hour of a new farm. */
export class WholeFarm1764642000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const sql of UP) await db.query(sql)
    // A certifier reads them: they say with what rate a record was sprayed.
    await db.query(`CREATE POLICY calibrations_read ON calibrations FOR SELECT USING (${FARM})`)
    await db.query(`CREATE POLICY calibrations_insert ON calibrations FOR INSERT WITH CHECK (${WRITE})`)
    await db.query(`CREATE POLICY calibrations_update ON calibrations FOR UPDATE USING (${WRITE}) WITH CHECK (${WRITE})`)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP TABLE calibrations')
    await db.query('ALTER TABLE accounts DROP COLUMN practice_farm_id')
    for (const column of ['fitting', 'retired_on', 'retired_reason']) await db.query(`ALTER TABLE sprayers DROP COLUMN ${column}`)
    for (const column of ['units', 'certificate', 'contact', 'rule_sets', 'calibration_days', 'home', 'practice', 'start_skipped', 'start_away']) {
      await db.query(`ALTER TABLE farms DROP COLUMN ${column}`)
    }
  }
}

const UP = [
  `ALTER TABLE farms
    ADD COLUMN units text NOT NULL DEFAULT 'metric', ADD COLUMN certificate jsonb, ADD COLUMN contact jsonb,
    ADD COLUMN rule_sets jsonb NOT NULL DEFAULT '[]', ADD COLUMN calibration_days integer NOT NULL DEFAULT 365, ADD COLUMN home jsonb,
    ADD COLUMN practice boolean NOT NULL DEFAULT false, ADD COLUMN start_skipped jsonb NOT NULL DEFAULT '[]', ADD COLUMN start_away boolean NOT NULL DEFAULT false,
    ADD CONSTRAINT farms_units_check CHECK (units IN ('metric', 'us')),
    ADD CONSTRAINT farms_calibration_check CHECK (calibration_days BETWEEN 1 AND 1830)`,
  'ALTER TABLE accounts ADD COLUMN practice_farm_id uuid',
  `ALTER TABLE sprayers
    ADD COLUMN fitting jsonb, ADD COLUMN retired_on date, ADD COLUMN retired_reason text,
    ADD CONSTRAINT sprayers_retired_check CHECK ((retired_on IS NULL) = (retired_reason IS NULL))`,
  `CREATE TABLE calibrations (
    farm_id uuid NOT NULL, id uuid NOT NULL, sprayer_id uuid NOT NULL, on_day date NOT NULL, due_on date NOT NULL, done_by text NOT NULL,
    measured jsonb NOT NULL, fitting jsonb NOT NULL, note text, by_id uuid NOT NULL, at timestamptz NOT NULL,
    withdrawn_at timestamptz, withdrawn_by_id uuid, withdrawn_reason text, creation_digest text NOT NULL,
    CONSTRAINT calibrations_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT calibrations_sprayer_fkey FOREIGN KEY (farm_id, sprayer_id) REFERENCES sprayers (farm_id, id),
    CONSTRAINT calibrations_by_fkey FOREIGN KEY (farm_id, by_id) REFERENCES people (farm_id, id),
    CONSTRAINT calibrations_withdrawn_by_fkey FOREIGN KEY (farm_id, withdrawn_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT calibrations_withdrawn_check CHECK ((withdrawn_at IS NULL) = (withdrawn_by_id IS NULL) AND (withdrawn_at IS NULL) = (withdrawn_reason IS NULL)))`,
  'CREATE INDEX calibrations_sprayer_idx ON calibrations (farm_id, sprayer_id, on_day, id)',
  'ALTER TABLE calibrations ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE calibrations FORCE ROW LEVEL SECURITY',
]
