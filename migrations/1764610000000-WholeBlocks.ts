import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `farm_id = nullif(current_setting('app.farm_id', true), '')::uuid`
/** Seasons a certifier may read; unset for the farm's own people. */
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`
const WRITE = `${FARM} AND ${SEASONS} IS NULL`

/** A certifier sees what belongs to a block that the grant opens: the policy of blocks decides inside these. */
const ofBlock = (table: string) => `EXISTS (SELECT 1 FROM blocks b WHERE b.farm_id = ${table}.farm_id AND b.id = ${table}.block_id)`
const READS: Record<string, string> = {
  block_boundaries: ofBlock('block_boundaries'),
  plantings: ofBlock('plantings'),
  beds: ofBlock('beds'),
  farm_event_blocks: ofBlock('farm_event_blocks'),
  farm_events: `season = ANY (${SEASONS}) AND EXISTS (SELECT 1 FROM farm_event_blocks e WHERE e.farm_id = farm_events.farm_id AND e.event_id = farm_events.id)`,
}

/** Versions of boundaries, land status, what grows, beds and rows, what else was done; blocks that end and what came of them. */
export class WholeBlocks1764610000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of [...BLOCKS, ...TABLES, ...GUARDS]) await db.query(statement)
    for (const [table, granted] of Object.entries(READS)) await this.protect(db, table, granted)
    await this.fill(db)
  }

  private async protect(db: QueryRunner, table: string, granted: string): Promise<void> {
    await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
    await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
    await db.query(`CREATE POLICY ${table}_read ON ${table} FOR SELECT USING (${FARM} AND (${SEASONS} IS NULL OR ${granted}))`)
    await db.query(`CREATE POLICY ${table}_insert ON ${table} FOR INSERT WITH CHECK (${WRITE})`)
    await db.query(`CREATE POLICY ${table}_update ON ${table} FOR UPDATE USING (${WRITE}) WITH CHECK (${WRITE})`)
  }

  /** The first version of every block that is there, farm by farm as the policies ask. */
  private async fill(db: QueryRunner): Promise<void> {
    const farms: { id: string }[] = await db.query('SELECT id FROM farms')
    for (const { id } of farms) {
      await db.query("SELECT set_config('app.farm_id', $1, true)", [id])
      await db.query(`INSERT INTO block_boundaries (farm_id, block_id, version, geometry, area_m2, perimeter_m, drawn_on, acknowledged, by_id, at)
        SELECT b.farm_id, b.id, b.version, b.geometry, b.area_m2, b.perimeter_m, (b.created_at AT TIME ZONE f.zone)::date, b.acknowledged,
          (SELECT j.person_id FROM journal j WHERE j.farm_id = b.farm_id AND j.subject_id = b.id AND j.action = 'block.created' LIMIT 1), b.created_at
        FROM blocks b JOIN farms f ON f.id = b.farm_id WHERE b.${FARM}`)
    }
    await db.query("SELECT set_config('app.farm_id', '', true)")
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP POLICY farm_events_read ON farm_events')
    for (const table of ['farm_event_blocks', 'farm_events', 'beds', 'plantings', 'block_boundaries']) await db.query(`DROP TABLE ${table}`)
    await db.query('DROP FUNCTION guard_farm_event()')
    await db.query('DROP INDEX blocks_farm_id_code_key')
    // Two blocks of one code, one of them ended, keep this from being taken back: one must be renamed first.
    await db.query('CREATE UNIQUE INDEX blocks_farm_id_code_key ON blocks (farm_id, lower(code))')
    await db.query(`ALTER TABLE blocks DROP CONSTRAINT blocks_ended_check, DROP COLUMN ended_on, DROP COLUMN ended_by,
      DROP COLUMN from_ids, DROP COLUMN into_ids, DROP COLUMN land`)
  }
}

const BLOCKS = [
  `ALTER TABLE blocks ADD COLUMN ended_on date, ADD COLUMN ended_by text,
    ADD COLUMN from_ids uuid[] NOT NULL DEFAULT '{}', ADD COLUMN into_ids uuid[] NOT NULL DEFAULT '{}', ADD COLUMN land jsonb,
    ADD CONSTRAINT blocks_ended_check CHECK ((ended_on IS NULL) = (ended_by IS NULL) AND ended_by IN ('split', 'merge', 'undone'))`,
  'ALTER TABLE blocks ALTER COLUMN from_ids DROP DEFAULT, ALTER COLUMN into_ids DROP DEFAULT',
  'DROP INDEX blocks_farm_id_code_key',
  // A part may go on under the code of the block that it came from.
  'CREATE UNIQUE INDEX blocks_farm_id_code_key ON blocks (farm_id, lower(code)) WHERE ended_on IS NULL',
]

const TABLES = [
  `CREATE TABLE block_boundaries (
    farm_id uuid NOT NULL, block_id uuid NOT NULL, version integer NOT NULL, geometry jsonb NOT NULL,
    area_m2 numeric NOT NULL, perimeter_m numeric NOT NULL, drawn_on date NOT NULL, note text,
    acknowledged jsonb NOT NULL DEFAULT '[]', by_id uuid, at timestamptz NOT NULL,
    CONSTRAINT block_boundaries_pkey PRIMARY KEY (farm_id, block_id, version),
    CONSTRAINT block_boundaries_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id),
    CONSTRAINT block_boundaries_by_fkey FOREIGN KEY (farm_id, by_id) REFERENCES people (farm_id, id))`,
  `CREATE TABLE plantings (
    farm_id uuid NOT NULL, id uuid NOT NULL, block_id uuid NOT NULL, part jsonb, crop text NOT NULL, eppo text, variety text,
    planted_on date, removed_on date, edible_part text, soil_contact text, harvests jsonb NOT NULL, plants integer,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT plantings_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT plantings_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id),
    CONSTRAINT plantings_span_check CHECK (removed_on >= planted_on),
    CONSTRAINT plantings_plants_check CHECK (plants > 0))`,
  'CREATE INDEX plantings_block_idx ON plantings (farm_id, block_id, id)',
  `CREATE TABLE beds (
    farm_id uuid NOT NULL, id uuid NOT NULL, block_id uuid NOT NULL, kind text NOT NULL, name text, from_number integer, to_number integer,
    count integer NOT NULL, length_m numeric, width_m numeric, plants integer, ended_on date,
    revision integer NOT NULL DEFAULT 1, creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT beds_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT beds_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id),
    CONSTRAINT beds_kind_check CHECK (kind IN ('bed', 'row')),
    CONSTRAINT beds_count_check CHECK (count > 0 AND plants > 0 AND length_m > 0 AND width_m > 0),
    CONSTRAINT beds_numbers_check CHECK ((from_number IS NULL) = (to_number IS NULL) AND from_number <= to_number))`,
  'CREATE INDEX beds_block_idx ON beds (farm_id, block_id, id)',
  `CREATE TABLE farm_events (
    farm_id uuid NOT NULL, id uuid NOT NULL, kind text NOT NULL, on_day date NOT NULL, season integer NOT NULL, note text,
    by_id uuid NOT NULL, at timestamptz NOT NULL,
    withdrawn_at timestamptz, withdrawn_by_id uuid, withdrawn_reason text, creation_digest text NOT NULL,
    CONSTRAINT farm_events_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT farm_events_by_fkey FOREIGN KEY (farm_id, by_id) REFERENCES people (farm_id, id),
    CONSTRAINT farm_events_withdrawn_by_fkey FOREIGN KEY (farm_id, withdrawn_by_id) REFERENCES people (farm_id, id),
    CONSTRAINT farm_events_kind_check CHECK (kind IN ('mulched', 'planted', 'mown', 'watered', 'first_pick', 'other')),
    CONSTRAINT farm_events_withdrawn_check CHECK ((withdrawn_at IS NULL) = (withdrawn_by_id IS NULL) AND (withdrawn_at IS NULL) = (withdrawn_reason IS NULL)))`,
  'CREATE INDEX farm_events_day_idx ON farm_events (farm_id, on_day DESC, id DESC)',
  `CREATE TABLE farm_event_blocks (
    farm_id uuid NOT NULL, event_id uuid NOT NULL, block_id uuid NOT NULL,
    CONSTRAINT farm_event_blocks_pkey PRIMARY KEY (farm_id, event_id, block_id),
    CONSTRAINT farm_event_blocks_event_fkey FOREIGN KEY (farm_id, event_id) REFERENCES farm_events (farm_id, id),
    CONSTRAINT farm_event_blocks_block_fkey FOREIGN KEY (farm_id, block_id) REFERENCES blocks (farm_id, id))`,
  'CREATE INDEX farm_event_blocks_block_idx ON farm_event_blocks (farm_id, block_id)',
]

const always = (table: string, trigger: string) => `ALTER TABLE ${table} ENABLE ALWAYS TRIGGER ${trigger}`
const standing = (table: string, deeds: string) => [
  `CREATE TRIGGER ${table}_rows_stay BEFORE ${deeds} ON ${table} FOR EACH ROW EXECUTE FUNCTION refuse_change()`,
  `CREATE TRIGGER ${table}_table_stands BEFORE TRUNCATE ON ${table} FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
  always(table, `${table}_rows_stay`), always(table, `${table}_table_stands`),
]

const GUARDS = [
  ...standing('block_boundaries', 'UPDATE OR DELETE'),
  ...standing('farm_event_blocks', 'UPDATE OR DELETE'),
  ...standing('farm_events', 'DELETE'),
  // An event stands as it was written; it can be taken back once, with a reason.
  `CREATE FUNCTION guard_farm_event() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.withdrawn_at IS NOT NULL OR (to_jsonb(NEW) - 'withdrawn_at' - 'withdrawn_by_id' - 'withdrawn_reason')
        <> (to_jsonb(OLD) - 'withdrawn_at' - 'withdrawn_by_id' - 'withdrawn_reason')
      THEN RAISE EXCEPTION 'an event of the farm stands as it was written' USING ERRCODE = '42501'; END IF;
      RETURN NEW;
    END $$`,
  'CREATE TRIGGER farm_events_stand BEFORE UPDATE ON farm_events FOR EACH ROW EXECUTE FUNCTION guard_farm_event()',
  always('farm_events', 'farm_events_stand'),
]
