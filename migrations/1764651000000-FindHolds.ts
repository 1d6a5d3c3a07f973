import type { MigrationInterface, QueryRunner } from 'typeorm'

/** What holds a block is found by the last day on which it does, however long ago the work was. */
export class FindHolds1764651000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query('ALTER TABLE record_lines ADD COLUMN held_to date')
    const farms: { id: string }[] = await db.query('SELECT id FROM farms')
    for (const { id } of farms) {
      // Farm by farm, as the policies ask.
      await db.query("SELECT set_config('app.farm_id', $1, true)", [id])
      await db.query(FILL)
    }
    await db.query("SELECT set_config('app.farm_id', '', true)")
    await db.query('CREATE INDEX record_lines_held_idx ON record_lines (farm_id, held_to) WHERE held_to IS NOT NULL')
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('DROP INDEX record_lines_held_idx')
    await db.query('ALTER TABLE record_lines DROP COLUMN held_to')
  }
}

/** greatest() passes over what is null. */
const FILL = `UPDATE record_lines l SET held_to = greatest(
    ((r.computed->'lines'->l.position->>'pickFrom')::date - 1),
    ((r.computed->'lines'->l.position->>'reEntryUntil')::timestamptz AT TIME ZONE f.zone)::date)
  FROM application_records r JOIN farms f ON f.id = r.farm_id
  WHERE l.farm_id = nullif(current_setting('app.farm_id', true), '')::uuid AND r.farm_id = l.farm_id AND r.id = l.record_id AND r.state = 'signed'`
