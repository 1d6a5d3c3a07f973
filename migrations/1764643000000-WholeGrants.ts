import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`

/** Grants that say who reviews, who gave them and when they were ended; the journal's place of a deed; heads that readers took away. */
export class WholeGrants1764643000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const statement of [...GRANTS, ...JOURNAL, ...HEADS]) await db.query(statement)
    await db.query(accountAccess('AND g.ended_at IS NULL'))
    await db.query(ACCOUNT_GRANTS)
    await db.query('REVOKE ALL ON FUNCTION account_grants(uuid, timestamptz) FROM PUBLIC')
    await db.query(assertRole(STILL_GRANTED))
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(assertRole('RETURN NEW;'))
    await db.query('DROP FUNCTION account_grants(uuid, timestamptz)')
    await db.query(accountAccess(''))
    await db.query('DROP TABLE season_heads')
    await db.query('DROP INDEX journal_person_idx')
    await db.query('ALTER TABLE journal DROP COLUMN from_network, DROP COLUMN from_device')
    await db.query('ALTER TABLE grants DROP COLUMN organisation, DROP COLUMN given_by_id, DROP COLUMN ended_at, DROP COLUMN revision, DROP COLUMN creation_digest, DROP CONSTRAINT grants_seasons_check')
  }
}

const GRANTS = [
  `ALTER TABLE grants ADD COLUMN organisation text NOT NULL DEFAULT '', ADD COLUMN given_by_id uuid, ADD COLUMN ended_at timestamptz,
    ADD COLUMN revision integer NOT NULL DEFAULT 1, ADD COLUMN creation_digest text NOT NULL DEFAULT '',
    ADD CONSTRAINT grants_given_by_fkey FOREIGN KEY (farm_id, given_by_id) REFERENCES people (farm_id, id),
    ADD CONSTRAINT grants_seasons_check CHECK (cardinality(seasons) >= 1)`,
]

const JOURNAL = [
  'ALTER TABLE journal ADD COLUMN from_network text, ADD COLUMN from_device text',
  'CREATE INDEX journal_person_idx ON journal (farm_id, person_id, at DESC, id DESC)',
]

const HEADS = [
  `CREATE TABLE season_heads (
    farm_id uuid NOT NULL, id uuid NOT NULL, account_id uuid NOT NULL, season integer NOT NULL,
    seq integer NOT NULL, digest text NOT NULL, taken_at timestamptz NOT NULL,
    CONSTRAINT season_heads_pkey PRIMARY KEY (farm_id, id),
    CONSTRAINT season_heads_farm_fkey FOREIGN KEY (farm_id) REFERENCES farms (id),
    CONSTRAINT season_heads_account_fkey FOREIGN KEY (account_id) REFERENCES accounts (id))`,
  'CREATE INDEX season_heads_account_idx ON season_heads (farm_id, account_id, season, taken_at DESC)',
  'ALTER TABLE season_heads ENABLE ROW LEVEL SECURITY',
  'ALTER TABLE season_heads FORCE ROW LEVEL SECURITY',
  `CREATE POLICY season_heads_read ON season_heads FOR SELECT USING (farm_id = ${FARM} AND (${SEASONS} IS NULL OR season = ANY (${SEASONS})))`,
  `CREATE POLICY season_heads_insert ON season_heads FOR INSERT WITH CHECK (farm_id = ${FARM} AND ${SEASONS} IS NULL)`,
  'CREATE TRIGGER season_heads_rows_stand BEFORE UPDATE OR DELETE ON season_heads FOR EACH ROW EXECUTE FUNCTION refuse_change()',
  'CREATE TRIGGER season_heads_table_stands BEFORE TRUNCATE ON season_heads FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()',
  'ALTER TABLE season_heads ENABLE ALWAYS TRIGGER season_heads_rows_stand',
  'ALTER TABLE season_heads ENABLE ALWAYS TRIGGER season_heads_table_stands',
]

const accountAccess = (standing: string): string => `CREATE OR REPLACE FUNCTION account_access(account uuid, at timestamptz)
  RETURNS TABLE (farm_id uuid, farm_name text, zone text, season_start text, role text, person_id uuid, person_name text, seasons integer[])
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
    SELECT f.id, f.name, f.zone, f.season_start, p.role, p.id, p.name, NULL::integer[]
      FROM public.people p JOIN public.farms f ON f.id = p.farm_id JOIN public.accounts a ON a.id = p.account_id
      WHERE p.account_id = account AND p.active AND a.deactivated_at IS NULL
    UNION ALL
    SELECT f.id, f.name, f.zone, f.season_start, 'certifier', NULL, NULL, array_agg(DISTINCT s.season ORDER BY s.season)
      FROM public.grants g JOIN public.farms f ON f.id = g.farm_id
        JOIN public.accounts a ON a.id = g.account_id AND a.deactivated_at IS NULL CROSS JOIN LATERAL unnest(g.seasons) AS s (season)
      WHERE g.account_id = account AND (at AT TIME ZONE f.zone)::date <= g.ends_on ${standing}
        AND NOT EXISTS (SELECT 1 FROM public.people p WHERE p.farm_id = g.farm_id AND p.account_id = account AND p.active)
      GROUP BY f.id, f.name, f.zone, f.season_start
    ORDER BY 2, 1 $$`

/** The caller's own grants over all farms: which season until when; nobody else's. */
const ACCOUNT_GRANTS = `CREATE FUNCTION account_grants(account uuid, at timestamptz)
  RETURNS TABLE (farm_id uuid, season integer, ends_on text)
  LANGUAGE sql STABLE SECURITY DEFINER SET search_path = pg_catalog, public, pg_temp AS $$
    SELECT g.farm_id, s.season, max(g.ends_on)::text
      FROM public.grants g JOIN public.farms f ON f.id = g.farm_id CROSS JOIN LATERAL unnest(g.seasons) AS s (season)
      WHERE g.account_id = account AND g.ended_at IS NULL AND (at AT TIME ZONE f.zone)::date <= g.ends_on
      GROUP BY g.farm_id, s.season $$`

/** What a certifier takes away is written down only while a grant of that season stands, and whoever ends it waits until it is written. */
const STILL_GRANTED = `IF asked IS DISTINCT FROM 'certifier' THEN RETURN NEW; END IF;
      PERFORM 1 FROM public.grants g JOIN public.farms f ON f.id = g.farm_id JOIN public.accounts a ON a.id = g.account_id
        WHERE g.farm_id = NEW.farm_id AND g.account_id = NEW.account_id AND g.ended_at IS NULL AND a.deactivated_at IS NULL
          AND (NEW.at AT TIME ZONE f.zone)::date <= g.ends_on
          AND (NEW.detail ->> 'season' IS NULL OR (NEW.detail ->> 'season')::integer = ANY (g.seasons)) FOR SHARE OF g;
      IF NOT FOUND THEN RAISE EXCEPTION 'the grant has ended' USING ERRCODE = 'FA404'; END IF;
      RETURN NEW;`

const assertRole = (withoutPerson: string): string => `CREATE OR REPLACE FUNCTION assert_role() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    asked text := nullif(current_setting('app.role', true), '');
    held text;
  BEGIN
    IF NEW.person_id IS NULL THEN
      ${withoutPerson}
    END IF;
    SELECT p.role INTO held FROM public.people p LEFT JOIN public.accounts a ON a.id = p.account_id
      WHERE p.farm_id = NEW.farm_id AND p.id = NEW.person_id AND p.active AND a.deactivated_at IS NULL FOR SHARE OF p;
    IF NOT FOUND THEN RAISE EXCEPTION 'the doer is no longer on the farm' USING ERRCODE = 'FA404'; END IF;
    IF held <> coalesce(asked, held) THEN RAISE EXCEPTION 'the doer has another role' USING ERRCODE = 'FA403'; END IF;
    RETURN NEW;
  END $$`
