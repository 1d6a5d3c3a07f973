import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
/** What a farm plans is its own: no grant opens it. */
const OWN = `${FARM} AND nullif(current_setting('app.seasons', true), '')::integer[] IS NULL`

/** Season plans, their steps, what people decided about jobs, and the records that were opened from jobs. */
export class AddRounds1764644000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of TABLES) await db.query(statement)
    for (const table of ['season_plans', 'plan_steps', 'plan_jobs', 'plan_job_records', 'job_digests']) {
      await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
      await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
      await db.query(`CREATE POLICY ${table}_own ON ${table} USING (${OWN}) WITH CHECK (${OWN})`)
    }
  }

  async down(db: QueryRunner): Promise<void> {
    for (const table of ['job_digests', 'plan_job_records', 'plan_jobs', 'plan_steps', 'season_plans']) await db.query(`DROP TABLE ${table}`)
  }
}

const TABLES = [
  `CREATE TABLE season_plans (
    farm_id uuid NOT NULL, id uuid NOT NULL, name text NOT NULL, note text, ended_at timestamptz, ended_reason text,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT season_plans_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT season_plans_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT season_plans_ended_check CHECK ((ended_at IS NULL) = (ended_reason IS NULL)))`,
  `CREATE TABLE plan_steps (
    farm_id uuid NOT NULL, id uuid NOT NULL, plan_id uuid NOT NULL, position integer NOT NULL, kind text NOT NULL, method text NOT NULL,
    material_id uuid NOT NULL, basis jsonb NOT NULL, water jsonb, block_ids uuid[] NOT NULL, every_days integer NOT NULL,
    first_on date NOT NULL, last_on date NOT NULL, early_days integer NOT NULL, late_days integer NOT NULL, removed_at timestamptz,
    CONSTRAINT plan_steps_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT plan_steps_plan_fkey FOREIGN KEY (farm_id, plan_id) REFERENCES season_plans (farm_id, id),
    CONSTRAINT plan_steps_material_fkey FOREIGN KEY (farm_id, material_id) REFERENCES materials (farm_id, id),
    CONSTRAINT plan_steps_rhythm_check CHECK (every_days > 0 AND early_days >= 0 AND early_days < every_days AND late_days >= 0 AND first_on <= last_on))`,
  'CREATE INDEX plan_steps_plan_idx ON plan_steps (farm_id, plan_id, position)',
  `CREATE TABLE plan_jobs (
    farm_id uuid NOT NULL, step_id uuid NOT NULL, block_id uuid NOT NULL, number integer NOT NULL, planned_on date,
    acknowledged jsonb NOT NULL DEFAULT '[]', skipped_at timestamptz, skipped_by_id uuid, skip_reason text, revision integer NOT NULL,
    CONSTRAINT plan_jobs_pkey PRIMARY KEY (farm_id, step_id, block_id, number),
    CONSTRAINT plan_jobs_step_fkey FOREIGN KEY (farm_id, step_id) REFERENCES plan_steps (farm_id, id),
    CONSTRAINT plan_jobs_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id),
    CONSTRAINT plan_jobs_skipped_by_fkey FOREIGN KEY (farm_id, skipped_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT plan_jobs_number_check CHECK (number > 0),
    CONSTRAINT plan_jobs_skip_check CHECK ((skipped_at IS NULL) = (skipped_by_id IS NULL) AND (skipped_at IS NULL) = (skip_reason IS NULL)))`,
  `CREATE TABLE plan_job_records (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, step_id uuid NOT NULL, block_id uuid NOT NULL, number integer NOT NULL,
    CONSTRAINT plan_job_records_pkey PRIMARY KEY (farm_id, record_id, step_id, block_id),
    CONSTRAINT plan_job_records_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id),
    CONSTRAINT plan_job_records_step_fkey FOREIGN KEY (farm_id, step_id) REFERENCES plan_steps (farm_id, id),
    CONSTRAINT plan_job_records_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id),
    CONSTRAINT plan_job_records_number_check CHECK (number > 0))`,
  'CREATE INDEX plan_job_records_step_idx ON plan_job_records (farm_id, step_id)',
  `CREATE TABLE job_digests (
    farm_id uuid NOT NULL, on_day date NOT NULL, at timestamptz NOT NULL, letters integer NOT NULL,
    CONSTRAINT job_digests_pkey PRIMARY KEY (farm_id, on_day),
    CONSTRAINT job_digests_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id))`,
]
