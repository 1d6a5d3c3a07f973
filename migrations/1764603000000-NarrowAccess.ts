import type { MigrationInterface, QueryRunner } from 'typeorm'

const FARM = `nullif(current_setting('app.farm_id', true), '')::uuid`
const SEASONS = `nullif(current_setting('app.seasons', true), '')::integer[]`

/** What stands in a record of the granted seasons, by the table that says so. Materials and sprayers stay open: the farm's list of them is what a certifier judges. */
const GRANTED: Record<string, string> = {
  blocks: `EXISTS (SELECT 1 FROM record_lines l WHERE l.farm_id = blocks.farm_id AND l.block_id = blocks.id AND l.season = ANY (${SEASONS}))`,
  lots: `EXISTS (SELECT 1 FROM record_components c WHERE c.farm_id = lots.farm_id AND c.lot_id = lots.id AND c.season = ANY (${SEASONS}))`,
  // The whole ledger of such a lot: its balance is nothing without what went elsewhere.
  lot_entries: 'EXISTS (SELECT 1 FROM lots o WHERE o.farm_id = lot_entries.farm_id AND o.id = lot_entries.lot_id)',
  season_counters: `season = ANY (${SEASONS})`,
}

/** A grant opens what stands in its seasons; nobody finishes a deed in a role that has ended. */
export class NarrowAccess1764603000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    for (const [table, granted] of Object.entries(GRANTED)) {
      await db.query(`ALTER POLICY ${table}_read ON ${table} USING (farm_id = ${FARM} AND (${SEASONS} IS NULL OR ${granted}))`)
    }
    await db.query(ASSERT_ROLE)
    await db.query('CREATE TRIGGER journal_by_who_may BEFORE INSERT ON journal FOR EACH ROW EXECUTE FUNCTION assert_role()')
    await db.query('ALTER TABLE journal ENABLE ALWAYS TRIGGER journal_by_who_may')
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP TRIGGER journal_by_who_may ON journal')
    await db.query('DROP FUNCTION assert_role()')
    for (const table of Object.keys(GRANTED)) await db.query(`ALTER POLICY ${table}_read ON ${table} USING (farm_id = ${FARM})`)
  }
}

/**
 * Every deed writes its entry in its own transaction, so here is where its doer is asked for once more, and held: whoever ends
 * the role now waits until the deed is done. The code tells whether the person is out (FA404) or has another role (FA403).
 */
const ASSERT_ROLE = `CREATE FUNCTION assert_role() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    asked text := nullif(current_setting('app.role', true), '');
    held text;
  BEGIN
    IF NEW.person_id IS NULL THEN RETURN NEW; END IF;
    SELECT p.role INTO held FROM public.people p LEFT JOIN public.accounts a ON a.id = p.account_id
      WHERE p.farm_id = NEW.farm_id AND p.id = NEW.person_id AND p.active AND a.deactivated_at IS NULL FOR SHARE OF p;
    IF NOT FOUND THEN RAISE EXCEPTION 'the doer is no longer on the farm' USING ERRCODE = 'FA404'; END IF;
    IF held <> coalesce(asked, held) THEN RAISE EXCEPTION 'the doer has another role' USING ERRCODE = 'FA403'; END IF;
    RETURN NEW;
  END $$`
