import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`
const SEASON_TABLES = ['register_entries', 'record_terms']

/** What finds a record in the register: one entry a record to sort and add up by, and its terms to look up by. */
export class FindInRegister1764602000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of TABLES) await db.query(statement)
    for (const table of SEASON_TABLES) {
      await this.protect(db, table, `farm_id = ${FARM} AND (${SEASONS} IS NULL OR season = ANY (${SEASONS}))`)
    }
    await this.protect(db, 'saved_filters', `farm_id = ${FARM}`, '')
    await this.fill(db)
  }

  /** A certifier writes nothing of the farm's; `writers` empty lets them, for what is their own. */
  private async protect(db: QueryRunner, table: string, condition: string, writers = ` AND ${SEASONS} IS NULL`): Promise<void> {
    await db.query(`ALTER TABLE ${table} ENABLE ROW LEVEL SECURITY`)
    await db.query(`ALTER TABLE ${table} FORCE ROW LEVEL SECURITY`)
    await db.query(`CREATE POLICY ${table}_read ON ${table} FOR SELECT USING (${condition})`)
    const write = `(${condition})${writers}`
    await db.query(`CREATE POLICY ${table}_insert ON ${table} FOR INSERT WITH CHECK (${write})`)
    await db.query(`CREATE POLICY ${table}_update ON ${table} FOR UPDATE USING (${write}) WITH CHECK (${write})`)
    await db.query(`CREATE POLICY ${table}_delete ON ${table} FOR DELETE USING (${write})`)
  }

  /** Entries and terms of the records that are there already, farm by farm as the policies ask. */
  private async fill(db: QueryRunner): Promise<void> {
    await db.query(WORDS)
    const farms: { id: string }[] = await db.query('SELECT id FROM farms')
    for (const { id } of farms) {
      await db.query("SELECT set_config('app.farm_id', $1, true)", [id])
      await db.query(ENTRIES)
      await db.query(TERMS)
    }
    await db.query("SELECT set_config('app.farm_id', '', true)")
    await db.query('DROP FUNCTION pg_temp.register_words(text)')
  }

  async down(db: QueryRunner): Promise<void> {
    for (const table of ['saved_filters', 'record_terms', 'register_entries']) await db.query(`DROP TABLE ${table}`)
  }
}

const TABLES = [
  `CREATE TABLE register_entries (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, state text NOT NULL, method text NOT NULL,
    season integer, work_season integer NOT NULL, sort_at timestamptz NOT NULL,
    number_sort bigint NOT NULL, area_sort double precision NOT NULL,
    area_ha numeric NOT NULL, total_l numeric, total_kg numeric NOT NULL, late boolean NOT NULL,
    CONSTRAINT register_entries_pkey PRIMARY KEY (farm_id, record_id),
    CONSTRAINT register_entries_record_fkey FOREIGN KEY (farm_id, record_id) REFERENCES application_records (farm_id, id))`,
  'CREATE INDEX register_entries_season_idx ON register_entries (farm_id, work_season, sort_at DESC, record_id DESC)',
  'CREATE INDEX register_entries_number_idx ON register_entries (farm_id, number_sort DESC, record_id DESC)',
  'CREATE INDEX register_entries_area_idx ON register_entries (farm_id, area_sort DESC, record_id DESC)',
  // No foreign key: some twenty rows a record, each looked up in vain, for no record is ever deleted.
  `CREATE TABLE record_terms (
    farm_id uuid NOT NULL, record_id uuid NOT NULL, term text COLLATE "C" NOT NULL,
    season integer, work_season integer NOT NULL, sort_at timestamptz NOT NULL,
    CONSTRAINT record_terms_pkey PRIMARY KEY (farm_id, record_id, term))`,
  // What the policy and the season ask for lies in the index too: a page of a filter touches no other row of the table.
  `CREATE INDEX record_terms_find_idx ON record_terms (farm_id, term, sort_at DESC, record_id DESC) INCLUDE (season, work_season)`,
  `CREATE TABLE saved_filters (
    farm_id uuid NOT NULL, id uuid NOT NULL, account_id uuid NOT NULL, name text NOT NULL, query jsonb NOT NULL,
    creation_digest text NOT NULL, created_at timestamptz NOT NULL,
    CONSTRAINT saved_filters_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT saved_filters_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT saved_filters_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id))`,
  'CREATE INDEX saved_filters_account_idx ON saved_filters (farm_id, account_id, name)',
]

/** Words as the server cut them when this was written. */
const WORDS = `CREATE FUNCTION pg_temp.register_words(written text) RETURNS SETOF text LANGUAGE sql IMMUTABLE AS $$
  WITH folded AS (SELECT normalize(regexp_replace(normalize(lower(coalesce(written, '')), NFKD), '[\\u0300-\\u036f]', '', 'g'), NFC) AS text),
    whole AS (SELECT regexp_replace(word, '^[^[:alnum:]]+|[^[:alnum:]]+$', '', 'g') AS word FROM folded, regexp_split_to_table(text, '\\s+') AS word),
    pieces AS (SELECT word FROM whole UNION SELECT piece FROM whole, regexp_split_to_table(word, '[^[:alnum:]]+') AS piece)
  SELECT left(word, 40) FROM pieces WHERE word <> ''
  UNION SELECT left(regexp_replace(word, '^0+', ''), 40) FROM pieces WHERE word ~ '^0+[0-9]' $$`

const WORK_SEASON = `coalesce(r.season, (SELECT extract(year FROM worked.on_day)::integer - (to_char(worked.on_day, 'MM-DD') < f.season_start)::integer
  FROM (SELECT (r.sort_at AT TIME ZONE f.zone)::date AS on_day) AS worked))`

const ENTRIES = `INSERT INTO register_entries
    (farm_id, record_id, state, method, season, work_season, sort_at, number_sort, area_sort, area_ha, total_l, total_kg, late)
  SELECT r.farm_id, r.id, r.state, r.register_row->>'method', r.season, ${WORK_SEASON}, r.sort_at,
    coalesce(r.season * 10000000::bigint + r.number, 9000000000000000), (r.register_row->>'areaHa')::float8,
    (r.register_row->>'areaHa')::numeric, (r.register_row->>'totalL')::numeric,
    coalesce((SELECT sum(c.amount * CASE c.unit WHEN 'kg' THEN 1 WHEN 'g' THEN 0.001 WHEN 'lb' THEN 0.45359237 WHEN 'oz' THEN 0.028349523125 END)
      FROM record_components c WHERE c.farm_id = r.farm_id AND c.record_id = r.id AND c.unit IN ('kg', 'g', 'lb', 'oz')), 0),
    r.register_row->>'lateHours' IS NOT NULL
  FROM application_records r JOIN farms f ON f.id = r.farm_id WHERE r.farm_id = ${FARM}`

/** A text is cut into words once, however many records say it. */
const TERMS = `WITH record AS MATERIALIZED (
    SELECT r.id, r.state, r.register_row, r.content, r.done_by_id, r.season, r.sort_at, ${WORK_SEASON} AS work_season
    FROM application_records r JOIN farms f ON f.id = r.farm_id WHERE r.farm_id = ${FARM}),
  line AS MATERIALIZED (SELECT l.record_id, l.block_id, b.name FROM record_lines l JOIN blocks b ON b.farm_id = l.farm_id AND b.id = l.block_id WHERE l.farm_id = ${FARM}),
  written AS MATERIALIZED (
    SELECT id, register_row->>'number' AS text FROM record UNION SELECT id, t.value FROM record, jsonb_each_text(content) AS t
      WHERE jsonb_typeof(content->t.key) = 'string' AND t.key NOT IN ('method', 'sprayerId', 'doneById', 'workedInOn')
    UNION SELECT id, jsonb_array_elements(register_row->'blocks')->>'code' FROM record UNION SELECT record_id, name FROM line
    UNION SELECT id, jsonb_array_elements_text(register_row->'preparations') FROM record UNION SELECT id, jsonb_array_elements_text(register_row->'lots') FROM record),
  words AS MATERIALIZED (SELECT t.text, w.word FROM (SELECT DISTINCT text FROM written) AS t, pg_temp.register_words(t.text) AS w (word)),
  found AS (
    SELECT id, 's:' || state AS term FROM record UNION SELECT id, 'm:' || (register_row->>'method') FROM record UNION SELECT id, 'p:' || done_by_id FROM record
    UNION SELECT record_id, 'b:' || block_id FROM line
    UNION SELECT record_id, 'i:' || material_id FROM record_components WHERE farm_id = ${FARM}
    UNION SELECT written.id, 'w:' || words.word FROM written JOIN words USING (text))
  INSERT INTO record_terms (farm_id, record_id, term, season, work_season, sort_at)
  SELECT ${FARM}, id, found.term, record.season, record.work_season, record.sort_at FROM found JOIN record USING (id)`
