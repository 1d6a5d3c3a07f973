import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
/** A certifier reads both: what lies beside a block is part of what is judged. */
const WRITE = `${FARM} AND nullif(current_setting('app.seasons', true), '') IS NULL`

/** Sites to keep clear of, and the farm's own ground plan. */
export class AddGround1764620000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(SITES)
    await db.query(GROUND)
    for (const table of ['sites', 'ground_features']) {
      await db.query(`CREATE INDEX ${table}_name_idx ON ${table} (farm_id, name, id)`)
      await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
      await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
      await db.query(`CREATE POLICY ${table}_read ON ${table} FOR SELECT USING (${FARM})`)
      await db.query(`CREATE POLICY ${table}_insert ON ${table} FOR INSERT WITH CHECK (${WRITE})`)
      await db.query(`CREATE POLICY ${table}_update ON ${table} FOR UPDATE USING (${WRITE}) WITH CHECK (${WRITE})`)
    }
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP TABLE ground_features')
    await db.query('DROP TABLE sites')
  }
}

const SITES = `CREATE TABLE sites (
  farm_id uuid NOT NULL, id uuid NOT NULL, kind text NOT NULL, name text NOT NULL, geometry jsonb NOT NULL,
  keep_clear_m numeric, note text, ended_on date,
  revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
  CONSTRAINT sites_pkey PRIMARY KEY (farm_id, id),
  CONSTRAINT sites_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
  CONSTRAINT sites_keep_clear_check CHECK (keep_clear_m > 0))`

const GROUND = `CREATE TABLE ground_features (
  farm_id uuid NOT NULL, id uuid NOT NULL, kind text NOT NULL, name text NOT NULL, geometry jsonb NOT NULL,
  width_m numeric, ended_on date,
  revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
  CONSTRAINT ground_features_pkey PRIMARY KEY (farm_id, id),
  CONSTRAINT ground_features_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
  CONSTRAINT ground_features_width_check CHECK (width_m > 0))`
